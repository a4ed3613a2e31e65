"use server";
import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { z } from "zod";
import { action } from "@/lib/auth/action";
import { orderFees } from "@/lib/commands/orderFees";
import { cancelOrder } from "@/lib/payments/cancelOrder";
import { startCheckout } from "@/lib/payments/startCheckout";

// One ticked box comes as a text, several as a list.
const chosenFees = z.object({ fee: z.union([z.uuid().transform((fee) => [fee]), z.array(z.uuid())]) });
const oneOrder = z.object({ order: z.uuid() });

/** Order the chosen fees and go to the card page. */
export const orderFeesAction = action(chosenFees, async ({ fee }, actor) => {
  const { id } = await orderFees(actor, fee);
  redirect((await startCheckout(actor, id)).url);
});

/** Back to the card page of an order that waits. */
export const payOrderAction = action(oneOrder, async ({ order }, actor) => {
  redirect((await startCheckout(actor, order)).url);
});

export const cancelOrderAction = action(oneOrder, async ({ order }, actor) => {
  await cancelOrder(actor, order);
  revalidatePath(`/${actor.employerSlug}/counter`, "layout");
});
