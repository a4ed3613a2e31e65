import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { POST } from "@/app/api/stripe/webhook/route";
import { NOW } from "../support/clock";
import { makeFirm } from "../support/factories";
import { checkoutEvent, signedDelivery, webhookRequest, type Delivery } from "../support/stripeEvents";
import { everythingStored } from "../support/written";
import { makeFees, makeOrder, type Order } from "./orders";

let order: Order;
beforeEach(async () => {
  vi.useFakeTimers({ now: NOW, toFake: ["Date"] });
  const firm = await makeFirm();
  order = await makeOrder(firm, await makeFees(firm, 1));
});
afterEach(() => void vi.useRealTimers());

const genuine = (over: Parameters<typeof signedDelivery>[1] = {}) =>
  signedDelivery(checkoutEvent("checkout.session.completed", order), over);
const cheaper = (text: string) => text.replace('"amount_total":19200', '"amount_total":1');

const FORGED: [string, () => Delivery][] = [
  ["no signature", () => ({ ...genuine(), signature: null })],
  ["an empty signature", () => ({ ...genuine(), signature: "" })],
  ["a signature that is none", () => ({ ...genuine(), signature: "v1=0000" })],
  ["another secret's signature", () => genuine({ secret: "whsec_of_somebody_else" })],
  ["a body that was changed", () => ({ ...genuine(), body: cheaper(genuine().body) })],
  ["another event's signature", () => ({ ...genuine(), signature: genuine().signature })],
  // The scheme's own limit, five minutes.
  ["a signature older than five minutes", () => genuine({ secondsAgo: 301 })],
  ["no body", () => ({ ...genuine(), body: "" })],
];

test.each(FORGED)("%s is answered 400, and nothing is stored", async (_what, delivery) => {
  const before = await everythingStored();
  const response = await POST(webhookRequest(delivery()));
  expect(response.status).toBe(400);
  expect(await everythingStored()).toEqual(before);
});

test.each([0, 300])("a genuine one, %i seconds old, is taken", async (secondsAgo) => {
  const response = await POST(webhookRequest(genuine({ secondsAgo })));
  expect(response.status).toBe(200);
  expect(await response.json()).toEqual({ outcome: `order ${order.id} paid` });
});
