import "server-only";
import { QueryTypes, type Transaction } from "sequelize";
import type Stripe from "stripe";
import { transact } from "@/lib/commands/transact";
import { db } from "@/lib/db";
import { closeExpired } from "./events/closeExpired";
import { settleOrder } from "./events/settleOrder";

type Handler = (event: Stripe.Event, transaction: Transaction) => Promise<string>;

/** Every event the product acts on. A delayed payment method completes unpaid and reports again. */
const HANDLERS: Partial<Record<Stripe.Event["type"], Handler>> = {
  "checkout.session.completed": settleOrder,
  "checkout.session.async_payment_succeeded": settleOrder,
  "checkout.session.async_payment_failed": closeExpired,
  "checkout.session.expired": closeExpired,
};

/** Claim and effect share one transaction: a repeat finds the claim, a crash releases it. Says in one sentence what happened. */
export const receiveStripeEvent = (event: Stripe.Event): Promise<string> =>
  transact(null, async (transaction) => {
    const handle = HANDLERS[event.type];
    if (!handle) return `ignored ${event.type}`;
    if (!(await claimEvent(event, transaction))) return "already handled";
    const outcome = await handle(event, transaction);
    await db.query(KEEP_OUTCOME, { replacements: { id: event.id, outcome }, transaction, type: QueryTypes.UPDATE });
    return outcome;
  });

// ON CONFLICT, since a caught unique violation would leave the PostgreSQL transaction unusable.
const CLAIM = `INSERT INTO stripe_events (id, type) VALUES (:id, :type) ON CONFLICT (id) DO NOTHING RETURNING id`;
const KEEP_OUTCOME = `UPDATE stripe_events SET outcome = :outcome WHERE id = :id`;

async function claimEvent({ id, type }: Stripe.Event, transaction: Transaction): Promise<boolean> {
  const claimed = await db.query(CLAIM, { replacements: { id, type }, type: QueryTypes.SELECT, transaction });
  return claimed.length === 1;
}
