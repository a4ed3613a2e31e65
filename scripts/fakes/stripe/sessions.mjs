import { randomBytes } from "node:crypto";
import { ApiError } from "./ApiError.mjs";

export const newId = (prefix) => `${prefix}_${randomBytes(12).toString("hex")}`;
export const nowS = () => Math.floor(Date.now() / 1000);

const SHORTEST_S = 30 * 60;
const LONGEST_S = 24 * 60 * 60;

/** A checkout session as the API returns it, plus the lines it was made of. */
export function newSession(form, payOrigin) {
  if (form.mode !== "payment") throw new ApiError(400, "Only mode=payment is known here.", { param: "mode" });
  if (!form.success_url) throw new ApiError(400, "Missing required param: success_url.", { param: "success_url" });
  const lines = linesOf(form.line_items);
  const total = lines.reduce((sum, line) => sum + line.amount_total, 0);
  const created = nowS();
  const id = newId("cs_test");
  return {
    lines,
    session: {
      id,
      object: "checkout.session",
      amount_subtotal: total,
      amount_total: total,
      cancel_url: form.cancel_url ?? null,
      client_reference_id: form.client_reference_id ?? null,
      created,
      currency: lines[0].currency,
      customer: null,
      customer_details: form.customer_email ? { email: form.customer_email } : null,
      customer_email: form.customer_email ?? null,
      expires_at: expiryOf(form.expires_at, created),
      livemode: false,
      metadata: { ...form.metadata },
      mode: "payment",
      payment_intent: null,
      payment_method_types: ["card"],
      payment_status: "unpaid",
      status: "open",
      success_url: form.success_url,
      url: `${payOrigin}/pay/${id}`,
    },
  };
}

export function completeSession(session) {
  mustBeOpen(session, "completed");
  Object.assign(session, { status: "complete", payment_status: "paid", payment_intent: newId("pi"), url: null });
}

export function expireSession(session) {
  mustBeOpen(session, "expired");
  Object.assign(session, { status: "expired", url: null });
}

function mustBeOpen(session, what) {
  if (session.status === "open") return;
  throw new ApiError(400, `Only an open Checkout Session can be ${what}; this one is ${session.status}.`);
}

function linesOf(items = {}) {
  const lines = Object.values(items).map((item, index) => {
    const { currency = "", unit_amount, product_data } = item.price_data ?? {};
    const at = `line_items[${index}]`;
    const amount = wholeNumber(unit_amount, `${at}[price_data][unit_amount]`);
    const quantity = wholeNumber(item.quantity ?? "1", `${at}[quantity]`);
    if (!/^[a-z]{3}$/.test(currency)) throw new ApiError(400, `Invalid currency: ${currency}`, { param: at });
    if (!product_data?.name) throw new ApiError(400, "Missing required param: product_data[name].", { param: at });
    return {
      id: newId("li"),
      object: "item",
      amount_total: amount * quantity,
      amount_subtotal: amount * quantity,
      currency,
      description: product_data.name,
      quantity,
    };
  });
  if (lines.length === 0) throw new ApiError(400, "Missing required param: line_items.", { param: "line_items" });
  if (new Set(lines.map((line) => line.currency)).size > 1) throw new ApiError(400, "All lines need one currency.");
  return lines;
}

function wholeNumber(text, param) {
  if (!/^\d{1,8}$/.test(text ?? "")) throw new ApiError(400, `Invalid integer: ${text}`, { param });
  return Number(text);
}

function expiryOf(text, created) {
  if (text === undefined) return created + LONGEST_S;
  const lasts = wholeTime(text) - created;
  if (lasts >= SHORTEST_S - 5 && lasts <= LONGEST_S + 5) return wholeTime(text);
  throw new ApiError(400, "expires_at must be between 30 minutes and 24 hours from now.", { param: "expires_at" });
}

const wholeTime = (text) => (/^\d{1,12}$/.test(text) ? Number(text) : NaN);
