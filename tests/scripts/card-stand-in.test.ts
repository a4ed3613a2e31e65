import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import Stripe from "stripe";
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from "vitest";
import { runScript, type RunningScript } from "../support/run-script";

// A process of its own is started, on a machine that may be busy.
vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });
const SECRET = "whsec_of_the_test";
const folder = mkdtempSync(path.join(tmpdir(), "card-"));
const heard: { body: string; signature: string }[] = [];
let answers: number[] = [];
const product = createServer(async (request, response) => {
  let body = "";
  for await (const chunk of request) body += String(chunk);
  heard.push({ body, signature: String(request.headers["stripe-signature"]) });
  response.writeHead(answers.shift() ?? 200).end();
});
let fake: RunningScript;
let stripe: Stripe;

async function startFake() {
  const { port } = product.address() as AddressInfo;
  fake = await runScript("scripts/fakes/stripe.mjs", {
    FAKE_STATE: path.join(folder, "state.json"),
    FAKE_WEBHOOK_URL: `http://127.0.0.1:${port}/api/stripe/webhook`,
    FAKE_WEBHOOK_SECRET: SECRET,
  });
  const { hostname, port: fakePort } = new URL(fake.origin);
  stripe = new Stripe("sk_test_1", { host: hostname, port: fakePort, protocol: "http", telemetry: false });
}
beforeAll(async () => {
  await new Promise<void>((resolve) => product.listen(0, "127.0.0.1", resolve));
  await startFake();
});
afterAll(async () => {
  await fake.stop();
  product.closeAllConnections();
  product.close();
  rmSync(folder, { recursive: true });
});
beforeEach(() => {
  heard.length = 0;
  answers = [];
});

const fee = (unit_amount: number, name = "Fee of a sitting") => ({
  quantity: 1,
  price_data: { currency: "eur", unit_amount, product_data: { name } },
});
const wanted = (reference: string): Stripe.Checkout.SessionCreateParams => ({
  mode: "payment",
  line_items: [fee(18_000), fee(18_000, "Fee of another sitting")],
  client_reference_id: reference,
  customer_email: "office@firm.example",
  metadata: { employer: "north" },
  success_url: "http://127.0.0.1:9/paid?session={CHECKOUT_SESSION_ID}",
  cancel_url: "http://127.0.0.1:9/fees",
});
const choose = (session: { url: string | null }, act: string) =>
  fetch(String(session.url), { method: "POST", redirect: "manual", body: new URLSearchParams({ act }) });
const events = () =>
  heard.map(({ body, signature }) => stripe.webhooks.constructEvent(body, signature, SECRET) as Stripe.Event);

test("a session comes back as it was asked for", async () => {
  const session = await stripe.checkout.sessions.create(wanted("order-1"));
  expect(session).toMatchObject({
    client_reference_id: "order-1",
    amount_total: 36_000,
    currency: "eur",
    payment_status: "unpaid",
    status: "open",
    metadata: { employer: "north" },
  });
  expect(session.expires_at - session.created).toBe(24 * 60 * 60);
  expect((await stripe.checkout.sessions.retrieve(session.id)).client_reference_id).toBe("order-1");
  expect((await stripe.checkout.sessions.listLineItems(session.id)).data.map((line) => line.amount_total)).toEqual([
    18_000, 18_000,
  ]);
});

test("the same idempotency key gives the same session, and never another one", async () => {
  const options = { idempotencyKey: "order-2" };
  const first = await stripe.checkout.sessions.create(wanted("order-2"), options);
  expect((await stripe.checkout.sessions.create(wanted("order-2"), options)).id).toBe(first.id);
  await expect(stripe.checkout.sessions.create(wanted("order-3"), options)).rejects.toMatchObject({
    type: "StripeIdempotencyError",
  });
});

test.each([
  ["no lines", { line_items: [] }],
  ["two currencies", { line_items: [fee(1), { ...fee(1), price_data: { ...fee(1).price_data, currency: "gbp" } }] }],
  ["a fraction of a cent", { line_items: [fee(0.5)] }],
  ["no way back", { success_url: "" }],
])("a session with %s is refused", async (_what, change) => {
  await expect(stripe.checkout.sessions.create({ ...wanted("order-4"), ...change })).rejects.toMatchObject({
    type: "StripeInvalidRequestError",
  });
});

test("an unknown session is not found", async () => {
  await expect(stripe.checkout.sessions.retrieve("cs_test_unknown")).rejects.toMatchObject({
    code: "resource_missing",
    statusCode: 404,
  });
});

describe("on the page", () => {
  test("what is owed is shown, and markup in a name stays text", async () => {
    const line_items = [fee(18_050, "<script>alert(1)</script>")];
    const session = await stripe.checkout.sessions.create({ ...wanted("order-5"), line_items });
    const shown = await (await fetch(String(session.url))).text();
    expect(shown).toContain("EUR&nbsp;180.50");
    expect(shown).not.toContain("<script>");
  });

  test("paying tells the product, signed, and sends the person back", async () => {
    const session = await stripe.checkout.sessions.create(wanted("order-6"));
    const answer = await choose(session, "pay");
    expect(answer.headers.get("location")).toBe(`http://127.0.0.1:9/paid?session=${session.id}`);
    const [event] = events();
    expect(event.type).toBe("checkout.session.completed");
    expect(event.api_version).toBe(Stripe.API_VERSION);
    expect(event.data.object).toMatchObject({ id: session.id, status: "complete", payment_status: "paid" });
    expect((await stripe.checkout.sessions.retrieve(session.id)).payment_intent).toMatch(/^pi_/);
    expect((await stripe.events.retrieve(event.id)).id).toBe(event.id);
  });

  test("paying twice pays once", async () => {
    const session = await stripe.checkout.sessions.create(wanted("order-7"));
    await choose(session, "pay");
    expect((await choose(session, "pay")).status).toBe(400);
    expect(heard).toHaveLength(1);
  });

  test("a declined card and walking away leave the payment open and tell nobody", async () => {
    const session = await stripe.checkout.sessions.create(wanted("order-8"));
    expect(await (await choose(session, "decline")).text()).toContain("The card was declined");
    expect((await choose(session, "leave")).headers.get("location")).toBe("http://127.0.0.1:9/fees");
    expect((await stripe.checkout.sessions.retrieve(session.id)).status).toBe("open");
    expect(heard).toHaveLength(0);
  });

  test("a payment left to expire tells the product", async () => {
    const session = await stripe.checkout.sessions.create(wanted("order-9"));
    expect((await choose(session, "expire")).headers.get("location")).toBe("http://127.0.0.1:9/fees");
    await vi.waitFor(() => expect(heard).toHaveLength(1), 5000);
    expect(events()[0]).toMatchObject({ type: "checkout.session.expired", data: { object: { id: session.id } } });
  });
});

test("the product can let a session expire, but not a paid one", async () => {
  const session = await stripe.checkout.sessions.create(wanted("order-10"));
  expect((await stripe.checkout.sessions.expire(session.id)).status).toBe("expired");
  const paid = await stripe.checkout.sessions.create(wanted("order-11"));
  await choose(paid, "pay");
  await expect(stripe.checkout.sessions.expire(paid.id)).rejects.toMatchObject({ statusCode: 400 });
});

test("an event the product could not take comes again, the same one", async () => {
  answers = [500, 503];
  await choose(await stripe.checkout.sessions.create(wanted("order-12")), "pay");
  await vi.waitFor(() => expect(heard).toHaveLength(3), 10_000);
  expect(new Set(events().map(({ id }) => id)).size).toBe(1);
});

test("a refund is counted against what was paid", async () => {
  const session = await stripe.checkout.sessions.create(wanted("order-13"));
  await choose(session, "pay");
  const payment_intent = String((await stripe.checkout.sessions.retrieve(session.id)).payment_intent);
  expect(await stripe.refunds.create({ payment_intent, amount: 18_000 })).toMatchObject({ status: "succeeded" });
  expect(await stripe.refunds.create({ payment_intent })).toMatchObject({ amount: 18_000 });
  await expect(stripe.refunds.create({ payment_intent })).rejects.toMatchObject({ code: "charge_already_refunded" });
});

test("a restart forgets no session and delivers what was left over", async () => {
  answers = Array.from({ length: 50 }, () => 500);
  const session = await stripe.checkout.sessions.create(wanted("order-14"));
  await choose(session, "pay");
  await fake.stop();
  answers = [];
  heard.length = 0;
  await startFake();
  await vi.waitFor(
    () => expect(events().map(({ data }) => (data.object as { id: string }).id)).toContain(session.id),
    5000,
  );
  expect((await stripe.checkout.sessions.retrieve(session.id)).payment_status).toBe("paid");
});
