import "server-only";
import type { Transaction } from "sequelize";
import type Stripe from "stripe";
import { writeMail } from "@/lib/commands/writeMail";
import { select } from "@/lib/db";
import { webEnv } from "@/lib/env";
import { log } from "@/lib/log";
import { Fee, Order } from "@/models";
import { orderOf } from "./orderOf";

type Waiting = { email: string; title: string; slug: string; assignmentId: string };

/** A completed checkout settles the fees of its order, if it was really paid and the money is the order's. */
export async function settleOrder(event: Stripe.Event, transaction: Transaction): Promise<string> {
  const session = event.data.object as Stripe.Checkout.Session;
  const order = await orderOf(session, transaction);
  if (!order) return `${session.id}: no such order`;
  if (order.paidAt) return `order ${order.id} is paid already`;
  if (session.payment_status !== "paid") return `order ${order.id} is not paid yet`;
  if (session.amount_total !== order.amountMinor || session.currency !== order.currency) {
    log.error({ order: order.id, session: session.id }, "a checkout was paid with other money than its order's");
    return `order ${order.id}: the amount differs, nothing settled`;
  }
  const settledAt = new Date(event.created * 1000);
  const where = { orderId: order.id, settledAt: null };
  const fees = await Fee.findAll({ where, order: ["id"], transaction, lock: transaction.LOCK.UPDATE });
  if (fees.reduce((sum, { amountMinor }) => sum + amountMinor, 0) !== order.amountMinor) {
    log.error({ order: order.id }, "an order was paid with a fee that another order carries: refund that by hand");
  }
  if (fees.length === 0) return `order ${order.id}: paid after it was closed, its fees are elsewhere`;
  await order.update({ paidAt: settledAt, closedAt: null }, { transaction });
  for (const fee of fees) await fee.update({ settledAt }, { transaction });
  await tellTechnicians(order, transaction);
  return `order ${order.id} paid`;
}

async function tellTechnicians(order: Order, transaction: Transaction): Promise<void> {
  for (const { email, title, slug, assignmentId } of await select<Waiting>(
    TECHNICIANS,
    { orderId: order.id },
    transaction,
  )) {
    const address = `${webEnv().PUBLIC_ORIGIN}/${slug}/assignments/${assignmentId}`;
    const body = `The fee of your sitting of "${title}" is settled. You can start it on the day that suits you.\n\n${address}\n`;
    await writeMail({ to: email, subject: `Your sitting is open: ${title}`, body }, transaction);
  }
}

const TECHNICIANS = `
  SELECT p.email, r.title, e.slug, a.id AS "assignmentId"
  FROM fees f JOIN assignments a ON a.id = f.assignment_id JOIN people p ON p.id = a.technician_id
  JOIN releases r ON r.id = a.release_id JOIN employers e ON e.id = a.employer_id
  WHERE f.order_id = :orderId`;
