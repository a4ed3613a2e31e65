import "server-only";
import Stripe from "stripe";
import { webEnv } from "@/lib/env";

const held = globalThis as typeof globalThis & { lagmarkStripe?: Stripe };

/** The payment service's own client; another host is named only where a stand-in answers for it. */
export const stripe = (): Stripe => (held.lagmarkStripe ??= connect());

function connect(): Stripe {
  const { STRIPE_SECRET_KEY, STRIPE_API_URL } = webEnv();
  const host = STRIPE_API_URL ? hostOf(new URL(STRIPE_API_URL)) : {};
  return new Stripe(STRIPE_SECRET_KEY, { ...host, telemetry: false, maxNetworkRetries: 2, timeout: 20_000 });
}

const hostOf = (url: URL) => ({
  host: url.hostname,
  port: Number(url.port || (url.protocol === "https:" ? 443 : 80)),
  protocol: url.protocol === "https:" ? ("https" as const) : ("http" as const),
});
