import "server-only";
import type { Transaction } from "sequelize";
import type Stripe from "stripe";
import { closeOrder } from "../closeOrder";
import { orderOf } from "./orderOf";

/** A card page that nobody finished, or a delayed payment that failed: the fees may be ordered again. */
export async function closeExpired(event: Stripe.Event, transaction: Transaction): Promise<string> {
  const session = event.data.object as Stripe.Checkout.Session;
  const order = await orderOf(session, transaction);
  if (!order) return `${session.id}: no such order`;
  if (order.paidAt) return `order ${order.id} is paid, not closed`;
  await closeOrder(order, new Date(event.created * 1000), transaction);
  return `order ${order.id} closed`;
}
