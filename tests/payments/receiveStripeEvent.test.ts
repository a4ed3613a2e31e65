import type Stripe from "stripe";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { POST } from "@/app/api/stripe/webhook/route";
import { orderFees } from "@/lib/commands/orderFees";
import { log } from "@/lib/log";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { checkoutEvent, signedDelivery, webhookRequest } from "../support/stripeEvents";
import { expectNothingLeft, jobsOf, rowsOf } from "../support/written";
import { makeFees, makeOrder, orderOf, settledFees, type Order } from "./orders";

const COMPLETED = "checkout.session.completed";
const EXPIRED = "checkout.session.expired";

let firm: Firm;
let fees: string[];
let order: Order;
beforeEach(async () => {
  // The service's library compares with the clock. Only the date stands still.
  vi.useFakeTimers({ now: NOW, toFake: ["Date"] });
  log.level = "silent";
  firm = await makeFirm();
  fees = await makeFees(firm, 2);
  order = await makeOrder(firm, fees);
});
afterEach(() => void vi.useRealTimers());

const deliver = async (event: Stripe.Event): Promise<string> => {
  const response = await POST(webhookRequest(signedDelivery(event)));
  expect(response.status).toBe(200);
  return ((await response.json()) as { outcome: string }).outcome;
};
const completed = (session: Partial<Stripe.Checkout.Session> = {}) => checkoutEvent(COMPLETED, order, session);
const cancel = () => ownerRows("UPDATE orders SET closed_at = $1 WHERE id = $2", [NOW, order.id]);

describe("a completed checkout", () => {
  test("settles the order and its fees, as of the event", async () => {
    const event = completed();
    expect(await deliver(event)).toBe(`order ${order.id} paid`);
    expect(await orderOf(order.id)).toMatchObject({ paidAt: NOW, closedAt: null });
    expect(await settledFees(order.id)).toEqual([NOW, NOW]);
    expect(await rowsOf("stripe_events")).toMatchObject([
      { id: event.id, type: COMPLETED, outcome: `order ${order.id} paid` },
    ]);
  });

  test("tells each technician that the sitting is open", async () => {
    await deliver(completed());
    const mails = await rowsOf<{ id: string; subject: string; body: string }>("mails");
    expect(mails.map(({ subject }) => subject)).toEqual(Array(2).fill("Your sitting is open: Prove a satellite"));
    const assignments = await rowsOf<{ id: string }>("assignments");
    const written = mails.map(({ body }) => body).join("\n");
    for (const { id } of assignments) expect(written).toContain(`/${firm.employer.slug}/assignments/${id}\n`);
    expect((await jobsOf("send-mail")).map(({ mailId }) => mailId).sort()).toEqual(mails.map(({ id }) => id).sort());
  });

  test("stands in the firm's trail as nobody's act", async () => {
    await deliver(completed());
    const sql = `SELECT act FROM trail_entries WHERE actor_id IS NULL AND employer_id = $1
      AND subject_key = ANY($2) AND act LIKE '%changed' ORDER BY act`;
    const acts = await ownerRows(sql, [firm.employer.id, [order.id, ...fees]]);
    expect(acts).toEqual([{ act: "fees changed" }, { act: "fees changed" }, { act: "orders changed" }]);
  });

  test("delivered twice, it counts once", async () => {
    const event = completed();
    await deliver(event);
    expect(await deliver(event)).toBe("already handled");
    expect(await rowsOf("mails")).toHaveLength(2);
  });

  test("delivered twice at once, it counts once", async () => {
    const event = completed();
    const outcomes = await Promise.all([deliver(event), deliver(event)]);
    expect(outcomes.sort()).toEqual(["already handled", `order ${order.id} paid`]);
    expect(await rowsOf("mails")).toHaveLength(2);
  });

  test("reported by two events at once, it counts once", async () => {
    const outcomes = await Promise.all([deliver(completed()), deliver(completed())]);
    expect(outcomes.sort()).toEqual([`order ${order.id} is paid already`, `order ${order.id} paid`]);
    expect(await rowsOf("mails")).toHaveLength(2);
  });
});

describe("out of order", () => {
  test("a page that expired after it was paid closes nothing", async () => {
    await deliver(completed());
    const expired = checkoutEvent(EXPIRED, order, { status: "expired", payment_status: "unpaid" });
    expect(await deliver(expired)).toBe(`order ${order.id} is paid, not closed`);
    expect(await orderOf(order.id)).toMatchObject({ paidAt: NOW, closedAt: null });
  });

  test("a payment that is told after the page expired is still a payment", async () => {
    const expired = checkoutEvent(EXPIRED, order, { status: "expired", payment_status: "unpaid" });
    expect(await deliver(expired)).toBe(`order ${order.id} closed`);
    expect(await orderOf(order.id)).toMatchObject({ paidAt: null, closedAt: NOW });
    expect(await deliver(completed())).toBe(`order ${order.id} paid`);
    expect(await orderOf(order.id)).toMatchObject({ paidAt: NOW, closedAt: null });
  });

  test("an order that is paid after its fees moved to another one settles nothing, and says so loudly", async () => {
    await cancel();
    const again = await makeOrder(firm, fees);
    const warned = vi.spyOn(log, "error");
    expect(await deliver(completed())).toMatch(/paid after it was closed, its fees are elsewhere$/);
    expect(warned).toHaveBeenCalledWith({ order: order.id }, expect.stringMatching(/refund/));
    expect(await settledFees(again.id)).toEqual([null, null]);
    expect(await orderOf(order.id)).toMatchObject({ paidAt: null });
  });

  test("where one of the fees has moved, the other is settled and the difference told", async () => {
    await cancel();
    const again = await makeOrder(firm, [fees[0]!]);
    const warned = vi.spyOn(log, "error");
    expect(await deliver(completed())).toBe(`order ${order.id} paid`);
    expect(warned).toHaveBeenCalledWith({ order: order.id }, expect.stringMatching(/refund/));
    expect(await settledFees(order.id)).toEqual([NOW]);
    expect(await settledFees(again.id)).toEqual([null]);
  });

  test("fees that are ordered while their order is being paid do not make the two wait for each other", async () => {
    for (let round = 0; round < 5; round += 1) {
      const more = await makeFees(firm, 3);
      const waiting = await makeOrder(firm, more);
      const event = checkoutEvent(COMPLETED, waiting);
      const orderAgain = () => orderFees(firm.administrator, more, NOW);
      const [paid, ...ordered] = await Promise.allSettled([deliver(event), orderAgain(), orderAgain()]);
      expect(paid).toMatchObject({ status: "fulfilled", value: `order ${waiting.id} paid` });
      for (const one of ordered) {
        if (one.status === "rejected") expect(one.reason).toMatchObject({ name: "ConflictError" });
        else expect(one.value).toEqual({ id: waiting.id });
      }
    }
  });
});

describe("settles nothing", () => {
  test.each<[string, Partial<Stripe.Checkout.Session>, RegExp]>([
    ["a penny too little", { amount_total: 38_399 }, /the amount differs/],
    ["a penny too much", { amount_total: 38_401 }, /the amount differs/],
    ["no amount", { amount_total: null }, /the amount differs/],
    ["another currency", { currency: "eur" }, /the amount differs/],
    ["a session that is not paid", { payment_status: "unpaid" }, /is not paid yet/],
    ["a session that needs no payment", { payment_status: "no_payment_required" }, /is not paid yet/],
    ["an unknown order", { client_reference_id: "00000000-0000-4000-8000-000000000000" }, /no such order/],
    ["an order that is none", { client_reference_id: "' OR true --" }, /no such order/],
    ["no order", { client_reference_id: null }, /no such order/],
  ])("by %s", async (_what, session, outcome) => {
    expect(await deliver(completed(session))).toMatch(outcome);
    expect(await orderOf(order.id)).toMatchObject({ paidAt: null, closedAt: null });
    expect(await settledFees(order.id)).toEqual([null, null]);
    expect(await rowsOf("mails")).toEqual([]);
  });

  test("by an event that the product does not act on, which leaves no row", async () => {
    expect(await deliver(checkoutEvent("payment_intent.created", order))).toBe("ignored payment_intent.created");
    expect(await rowsOf("stripe_events")).toEqual([]);
  });
});

describe("a delayed way of paying", () => {
  test("completes unpaid and settles once the money is there", async () => {
    await deliver(completed({ payment_status: "unpaid" }));
    const arrived = checkoutEvent("checkout.session.async_payment_succeeded", order);
    expect(await deliver(arrived)).toBe(`order ${order.id} paid`);
    expect(await settledFees(order.id)).toEqual([NOW, NOW]);
  });

  test("that fails closes the order, and its fees can be ordered again", async () => {
    await deliver(completed({ payment_status: "unpaid" }));
    const failed = checkoutEvent("checkout.session.async_payment_failed", order, { payment_status: "unpaid" });
    expect(await deliver(failed)).toBe(`order ${order.id} closed`);
    expect((await makeOrder(firm, fees)).id).not.toBe(order.id);
  });
});

test("an expired page closes the order, and its fees can be ordered again", async () => {
  await deliver(checkoutEvent(EXPIRED, order, { status: "expired", payment_status: "unpaid" }));
  expect(await orderOf(order.id)).toMatchObject({ closedAt: NOW });
  expect((await makeOrder(firm, fees)).id).not.toBe(order.id);
});

test("a failure of ours is no answer, releases the claim, and the next delivery does it all", async () => {
  const event = completed();
  await expectNothingLeft("fees", () => POST(webhookRequest(signedDelivery(event))));
  expect(await deliver(event)).toBe(`order ${order.id} paid`);
});
