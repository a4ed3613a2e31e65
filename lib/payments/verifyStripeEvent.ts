import "server-only";
import Stripe from "stripe";
import { webEnv } from "@/lib/env";
import { stripe } from "./stripe";

/** The event, or null when the signature is missing, wrong or older than the scheme's five minutes. */
export function verifyStripeEvent(body: string, signature: string | null): Stripe.Event | null {
  try {
    return stripe().webhooks.constructEvent(body, signature ?? "", webEnv().STRIPE_WEBHOOK_SECRET);
  } catch (error) {
    if (error instanceof Stripe.errors.StripeSignatureVerificationError) return null;
    throw error;
  }
}
