import "server-only";
import type { Transaction } from "sequelize";
import type Stripe from "stripe";
import { Order } from "@/models";

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/** The order a checkout was started for, locked. The session's own id is not needed: it may be stored a moment later than the event comes. */
export async function orderOf(session: Stripe.Checkout.Session, transaction: Transaction): Promise<Order | null> {
  const id = session.client_reference_id;
  return id && UUID.test(id) ? Order.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE }) : null;
}
