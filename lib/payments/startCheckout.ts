import "server-only";
import type Stripe from "stripe";
import { lockOwnOrder } from "@/lib/commands/lockOwnOrder";
import { transact } from "@/lib/commands/transact";
import { select } from "@/lib/db";
import { ConflictError } from "@/lib/errors";
import { webEnv } from "@/lib/env";
import type { Actor } from "@/lib/policies/actor";
import { stripe } from "./stripe";

type Line = { amountMinor: number; currency: string; name: string };

const CANCELLED = "This order is cancelled. Order the fees again.";

/**
 * The address of the hosted card page for an order. Asked twice, or again after a crash half-way, it is the same
 * page: the order's id is the idempotency key.
 */
export async function startCheckout(actor: Actor, orderId: string): Promise<{ url: string }> {
  const order = await transact(actor, (transaction) => lockOwnOrder(actor, orderId, transaction));
  if (order.paidAt) throw new ConflictError("This order is paid.");
  if (order.closedAt) throw new ConflictError(CANCELLED);
  if (order.checkoutUrl) return { url: order.checkoutUrl };
  const back = `${webEnv().PUBLIC_ORIGIN}/${actor.employerSlug}/counter/orders/${orderId}`;
  const lines = await select<Line>(LINES, { orderId });
  const session = await stripe().checkout.sessions.create(
    {
      mode: "payment",
      client_reference_id: orderId,
      line_items: lines.map(lineItem),
      success_url: back,
      cancel_url: `${back}?left=1`,
      metadata: { order: orderId },
    },
    { idempotencyKey: `order-${orderId}` },
  );
  const closedAt = await transact(actor, async (transaction) => {
    const locked = await lockOwnOrder(actor, orderId, transaction);
    await locked.update({ checkoutSessionId: session.id, checkoutUrl: session.url }, { transaction });
    return locked.closedAt;
  });
  if (!closedAt) return { url: session.url! };
  // Cancelled while the page was made: it must not be paid.
  await stripe().checkout.sessions.expire(session.id);
  throw new ConflictError(CANCELLED);
}

const lineItem = ({ amountMinor, currency, name }: Line): Stripe.Checkout.SessionCreateParams.LineItem => ({
  quantity: 1,
  price_data: { currency, unit_amount: amountMinor, product_data: { name } },
});

// The line says the same whatever the outcome will be.
const LINES = `
  SELECT f.amount_minor AS "amountMinor", f.currency, 'Sitting and decision, certificate included: ' || r.title || ', ' || p.name AS name
  FROM fees f JOIN assignments a ON a.id = f.assignment_id JOIN releases r ON r.id = a.release_id JOIN people p ON p.id = a.technician_id
  WHERE f.order_id = :orderId ORDER BY p.name, r.title`;
