import { randomUUID } from "node:crypto";
import Stripe from "stripe";
import { NOW } from "./clock";

const SECONDS = Math.floor(NOW.getTime() / 1000);
const stripe = new Stripe("sk_test_of_tests");

type Order = { id: string; amountMinor: number; currency: string };
type Session = Partial<Stripe.Checkout.Session>;
export type Delivery = { body: string; signature: string | null };

/** An event about the checkout of an order, paid in full unless the session says something else. */
export function checkoutEvent(type: string, { id, amountMinor, currency }: Order, session: Session = {}): Stripe.Event {
  const object = {
    ...{ id: `cs_test_${id}`, object: "checkout.session", client_reference_id: id, status: "complete" },
    ...{ amount_total: amountMinor, currency, payment_status: "paid", ...session },
  };
  const envelope = { id: `evt_${randomUUID()}`, object: "event", api_version: Stripe.API_VERSION, created: SECONDS };
  return { ...envelope, livemode: false, pending_webhooks: 1, type, data: { object } } as unknown as Stripe.Event;
}

/** As the payment service delivers it: signed by its own library, `secondsAgo` before NOW. */
export function signedDelivery(event: Stripe.Event, { secret = secretOfTests(), secondsAgo = 0 } = {}): Delivery {
  const body = JSON.stringify(event);
  const timestamp = SECONDS - secondsAgo;
  return { body, signature: stripe.webhooks.generateTestHeaderString({ payload: body, secret, timestamp }) };
}

export const webhookRequest = ({ body, signature }: Delivery): Request =>
  new Request("http://127.0.0.1/api/stripe/webhook", {
    method: "POST",
    body,
    headers: signature === null ? {} : { "stripe-signature": signature },
  });

const secretOfTests = () => process.env.STRIPE_WEBHOOK_SECRET!;
