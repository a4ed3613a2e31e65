import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { runScript } from "../support/run-script";
import type { Delivery } from "../support/stripeEvents";

/**
 * The local stand-in for the card payments, on a free port of its own. What it tells the product is kept until the
 * test hands it on, so that nothing arrives behind a test's back.
 */
export async function startCardStandIn() {
  const told: Delivery[] = [];
  const product = createServer(async (request, response) => {
    let body = "";
    for await (const chunk of request) body += String(chunk);
    told.push({ body, signature: String(request.headers["stripe-signature"]) });
    response.writeHead(200).end();
  });
  await new Promise<void>((resolve) => product.listen(0, "127.0.0.1", resolve));
  const { port } = product.address() as AddressInfo;
  const folder = mkdtempSync(path.join(tmpdir(), "card-"));
  const fake = await runScript("scripts/fakes/stripe.mjs", {
    FAKE_PORT: "0",
    FAKE_STATE: path.join(folder, "state.json"),
    FAKE_WEBHOOK_URL: `http://127.0.0.1:${port}/`,
    FAKE_WEBHOOK_SECRET: process.env.STRIPE_WEBHOOK_SECRET!,
  });
  const stop = async () => {
    await fake.stop();
    product.closeAllConnections();
    product.close();
    rmSync(folder, { recursive: true });
  };
  return { origin: fake.origin, told, stop };
}

/** What a person does on the hosted page. */
export const choose = (url: string, act: "pay" | "decline" | "leave") =>
  fetch(url, { method: "POST", redirect: "manual", body: new URLSearchParams({ act }) });
