import { receiveStripeEvent } from "@/lib/payments/receiveStripeEvent";
import { verifyStripeEvent } from "@/lib/payments/verifyStripeEvent";

/** 400 only for a bad signature; a fault of ours throws, becomes 500 and is delivered again. */
export async function POST(request: Request): Promise<Response> {
  const event = verifyStripeEvent(await request.text(), request.headers.get("stripe-signature"));
  if (!event) return new Response("bad signature", { status: 400 });
  return Response.json({ outcome: await receiveStripeEvent(event) });
}
