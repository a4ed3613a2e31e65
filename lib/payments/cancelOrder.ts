import "server-only";
import { lockOwnOrder } from "@/lib/commands/lockOwnOrder";
import { transact } from "@/lib/commands/transact";
import { ConflictError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { closeOrder } from "./closeOrder";
import { stripe } from "./stripe";

/** Give an unpaid order up, so that its fees can be ordered again. The card page is closed first: it must not be paid afterwards. */
export async function cancelOrder(actor: Actor, orderId: string, now = new Date()): Promise<void> {
  const order = await transact(actor, (transaction) => lockOwnOrder(actor, orderId, transaction));
  if (order.checkoutSessionId && !order.paidAt) {
    const session = await stripe().checkout.sessions.retrieve(order.checkoutSessionId);
    if (session.status === "complete")
      throw new ConflictError("This order is paid; the register is told once the money is there.");
    if (session.status === "open") await stripe().checkout.sessions.expire(order.checkoutSessionId);
  }
  await transact(actor, async (transaction) => {
    const locked = await lockOwnOrder(actor, orderId, transaction);
    if (locked.paidAt) throw new ConflictError("This order is paid.");
    await closeOrder(locked, now, transaction);
  });
}
