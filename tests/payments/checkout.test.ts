import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from "vitest";
import { POST } from "@/app/api/stripe/webhook/route";
import { orderFees } from "@/lib/commands/orderFees";
import { log } from "@/lib/log";
import { cancelOrder } from "@/lib/payments/cancelOrder";
import { startCheckout } from "@/lib/payments/startCheckout";
import { stripe } from "@/lib/payments/stripe";
import { refusals } from "../commands/refusals";
import { minutesFrom, NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { webhookRequest } from "../support/stripeEvents";
import { everythingStored, rowsOf } from "../support/written";
import { choose, startCardStandIn } from "./card-stand-in";
import { makeFees, makeOrder, orderOf, settledFees, type Order } from "./orders";

// A process of its own is started, on a machine that may be busy.
vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

let card: Awaited<ReturnType<typeof startCardStandIn>>;
beforeAll(async () => {
  log.level = "silent";
  card = await startCardStandIn();
  // Read once, at the first use of the client.
  Object.assign(process.env, { STRIPE_API_URL: card.origin, DEMONSTRATION: "1" });
});
afterAll(() => card.stop());

let firm: Firm;
let other: Firm;
let fees: string[];
let order: Order;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  fees = await makeFees(firm, 2);
  order = await makeOrder(firm, fees);
  card.told.length = 0;
});
const start = (actor = firm.administrator, id = order.id) => startCheckout(actor, id);
const cancel = (actor = firm.administrator, id = order.id) => cancelOrder(actor, id, NOW);
const session = async () => {
  const [row] = await ownerRows<{ id: string }>("SELECT checkout_session_id AS id FROM orders WHERE id = $1", [
    order.id,
  ]);
  return stripe().checkout.sessions.retrieve(row!.id);
};
const handOn = async () => {
  for (const delivery of card.told.splice(0)) expect((await POST(webhookRequest(delivery))).status).toBe(200);
};
const refused = async (act: () => Promise<unknown>, message: RegExp) => {
  const before = await everythingStored();
  await expect(act()).rejects.toMatchObject({ name: "ConflictError", message: expect.stringMatching(message) });
  expect(await everythingStored()).toEqual(before);
};

describe("the card page", () => {
  test("asks for the order's money, line by line, and leads back to the order", async () => {
    const { url } = await start();
    expect(new URL(url).origin).toBe(card.origin);
    const made = await session();
    const back = `${process.env.PUBLIC_ORIGIN}/${firm.employer.slug}/counter/orders/${order.id}`;
    expect(made).toMatchObject({
      ...{ client_reference_id: order.id, amount_total: 38_400, currency: "gbp", status: "open", url },
      ...{ success_url: back, cancel_url: `${back}?left=1` },
    });
    const lines = await stripe().checkout.sessions.listLineItems(made.id);
    const names = lines.data.map(({ description, amount_total }) => `${description}: ${amount_total}`);
    const { name } = firm.technician;
    expect(names).toEqual(
      Array(2).fill(`Sitting and decision, certificate included: Prove a satellite, ${name}: 19200`),
    );
  });

  test("asked for twice, also at once, it is the same page", async () => {
    const [one, two] = await Promise.all([start(), start()]);
    expect(two).toEqual(one);
    expect(await start(await makeActor(firm.employer, ["administrator"]))).toEqual(one);
  });

  test("asked for again after a stop between the page and our note of it, it is the same page", async () => {
    const first = await start();
    await ownerRows("UPDATE orders SET checkout_session_id = NULL, checkout_url = NULL WHERE id = $1", [order.id]);
    expect(await start()).toEqual(first);
  });

  test("paid there, the fees are settled", async () => {
    const { url } = await start();
    await choose(url, "pay");
    await handOn();
    expect((await orderOf(order.id)).paidAt).toBeInstanceOf(Date);
    expect((await settledFees(order.id)).every((at) => at instanceof Date)).toBe(true);
    await refused(start, /^This order is paid\.$/);
  });

  test.each(["decline", "leave"] as const)("a person who meets a %s finds the same page again", async (act) => {
    const first = await start();
    await choose(first.url, act);
    expect(card.told).toEqual([]);
    expect(await start()).toEqual(first);
    expect(await settledFees(order.id)).toEqual([null, null]);
  });

  test("is not made for an order that is cancelled", async () => {
    await cancel();
    await refused(start, /cancelled\. Order the fees again/);
  });

  test("is closed again when the order is cancelled while it is made", async () => {
    const { sessions } = stripe().checkout;
    const create = sessions.create.bind(sessions);
    vi.spyOn(sessions, "create").mockImplementationOnce(async (...asked) => {
      const made = await create(...(asked as Parameters<typeof create>));
      await cancel();
      return made;
    });
    await expect(start()).rejects.toMatchObject({ name: "ConflictError" });
    expect((await session()).status).toBe("expired");
    expect(await orderOf(order.id)).toMatchObject({ paidAt: null, closedAt: NOW });
  });

  refusals({
    allowed: "administrator",
    setting: () => ({ firm, other, id: order.id }),
    act: (actor, id) => start(actor, id),
  });
});

describe("cancelling", () => {
  test("an order without a page frees its fees", async () => {
    await cancel();
    expect(await orderOf(order.id)).toMatchObject({ closedAt: NOW, paidAt: null });
    expect((await makeOrder(firm, fees)).id).not.toBe(order.id);
  });

  test("closes the page, so that it cannot be paid afterwards", async () => {
    const { url } = await start();
    await cancel();
    expect((await session()).status).toBe("expired");
    expect((await choose(url, "pay")).status).toBe(400);
    await handOn();
    expect(await orderOf(order.id)).toMatchObject({ closedAt: NOW, paidAt: null });
  });

  test("twice keeps the first time", async () => {
    await start();
    await cancel();
    await cancelOrder(firm.administrator, order.id, minutesFrom(NOW, 5));
    expect(await orderOf(order.id)).toMatchObject({ closedAt: NOW });
  });

  test("is refused once the order is paid", async () => {
    await choose((await start()).url, "pay");
    await handOn();
    await refused(cancel, /^This order is paid\.$/);
  });

  test("is refused while the payment is known to the service and not to us yet", async () => {
    await choose((await start()).url, "pay");
    await refused(cancel, /once the money is there/);
    await handOn();
    expect((await orderOf(order.id)).paidAt).toBeInstanceOf(Date);
  });

  test("paid in the very moment after it was cancelled, it is paid after all", async () => {
    await choose((await start()).url, "pay");
    await ownerRows("UPDATE orders SET closed_at = $1 WHERE id = $2", [NOW, order.id]);
    await handOn();
    expect(await orderOf(order.id)).toMatchObject({ closedAt: null });
    expect((await settledFees(order.id)).every((at) => at instanceof Date)).toBe(true);
  });

  test("fees of two people's orders stay apart", async () => {
    const elsewhere = await orderFees(other.administrator, await makeFees(other, 1), NOW);
    await cancel();
    expect(await orderOf(elsewhere.id)).toMatchObject({ closedAt: null });
    expect(await rowsOf("orders")).toHaveLength(2);
  });

  refusals({
    allowed: "administrator",
    setting: () => ({ firm, other, id: order.id }),
    act: (actor, id) => cancel(actor, id),
  });
});
