import { createHash } from "node:crypto";
import { bodyOf, sendJson } from "../page.mjs";
import { ApiError, noSuch } from "./ApiError.mjs";
import { parseForm } from "./parseForm.mjs";
import { expireSession, newId, newSession, nowS } from "./sessions.mjs";

const ROUTES = [
  ["POST", /^\/v1\/checkout\/sessions$/, createSession],
  ["GET", /^\/v1\/checkout\/sessions\/(\w+)$/, ({ store }, id) => sessionOf(store, id).session],
  ["GET", /^\/v1\/checkout\/sessions\/(\w+)\/line_items$/, ({ store }, id) => list(sessionOf(store, id).lines)],
  ["POST", /^\/v1\/checkout\/sessions\/(\w+)\/expire$/, expire],
  ["GET", /^\/v1\/events$/, ({ store, query }) => list(eventsOf(store, query))],
  ["GET", /^\/v1\/events\/(\w+)$/, ({ store }, id) => store.events[id] ?? refuse("event", id)],
  ["POST", /^\/v1\/refunds$/, refund],
];

/** The few endpoints of the payment API that the product calls, with their idempotency keys. */
export async function answerApi(request, response, context) {
  const { store } = context;
  const { pathname, searchParams } = new URL(request.url, context.origin);
  const body = await bodyOf(request);
  const headers = { "request-id": newId("req") };
  const key = request.method === "POST" ? request.headers["idempotency-key"] : undefined;
  const sent = createHash("sha256").update(`${pathname}\n${body}`).digest("hex");
  try {
    if (!/^(Bearer|Basic) ./.test(request.headers.authorization ?? "")) {
      throw new ApiError(401, "You did not provide an API key.");
    }
    const kept = key && store.answers[key];
    if (kept && kept.sent !== sent) {
      const message =
        "Keys for idempotent requests can only be used with the same parameters they were first used with.";
      throw new ApiError(400, message, { type: "idempotency_error" });
    }
    if (kept) return sendJson(response, 200, kept.answer, { ...headers, "idempotent-replayed": "true" });
    const found = ROUTES.find(([method, path]) => method === request.method && path.test(pathname));
    if (!found) throw new ApiError(404, `Unrecognized request URL (${request.method}: ${pathname}).`);
    const apiVersion = request.headers["stripe-version"] ?? null;
    const id = pathname.match(found[1])[1];
    const answer = found[2]({ ...context, apiVersion, form: parseForm(body), query: searchParams }, id);
    if (key) store.answers[key] = { sent, answer: structuredClone(answer) };
    if (request.method === "POST") store.save();
    sendJson(response, 200, answer, headers);
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    sendJson(response, error.status, error.body, headers);
  }
}

export const sessionOf = (store, id) => store.sessions[id] ?? refuse("checkout.session", id);

function createSession({ store, form, origin, apiVersion }) {
  const made = newSession(form, origin);
  store.sessions[made.session.id] = { ...made, apiVersion };
  return made.session;
}

function expire({ store, webhooks, apiVersion }, id) {
  const { session } = sessionOf(store, id);
  expireSession(session);
  void webhooks.emit("checkout.session.expired", session, apiVersion);
  return session;
}

function refund({ store, form, webhooks, apiVersion }) {
  const paid = Object.values(store.sessions).find(({ session }) => session.payment_intent === form.payment_intent);
  if (!form.payment_intent || !paid) return refuse("payment_intent", form.payment_intent);
  const { amount_total: total, currency, payment_intent } = paid.session;
  const earlier = Object.values(store.refunds).filter((one) => one.payment_intent === payment_intent);
  const left = total - earlier.reduce((sum, one) => sum + one.amount, 0);
  const amount = form.amount === undefined ? left : Number(form.amount);
  if (left === 0) throw new ApiError(400, "The charge has already been refunded.", { code: "charge_already_refunded" });
  if (!Number.isInteger(amount) || amount <= 0 || amount > left) {
    throw new ApiError(400, `Refund amount (${form.amount}) is not between 1 and ${left}.`, { param: "amount" });
  }
  const common = { amount, created: nowS(), currency, metadata: { ...form.metadata }, payment_intent };
  const made = { id: newId("re"), object: "refund", ...common, reason: form.reason ?? null, status: "succeeded" };
  store.refunds[made.id] = made;
  void webhooks.emit("refund.created", made, apiVersion);
  return made;
}

/** Newest first, as the hosted service lists them. */
function eventsOf(store, query) {
  const types = [query.get("type"), ...query.getAll("types[]"), ...indexed(query, "types")].filter(Boolean);
  const since = Number(query.get("created[gte]") ?? 0);
  const events = Object.values(store.events).filter(
    ({ type, created }) => created >= since && (types.length === 0 || types.includes(type)),
  );
  return events.reverse().slice(0, Number(query.get("limit") ?? 10));
}

const indexed = (query, name) =>
  [...query].filter(([key]) => /^(\w+)\[\d+\]$/.exec(key)?.[1] === name).map(([, v]) => v);
const list = (data) => ({ object: "list", data, has_more: false });

function refuse(what, id) {
  throw noSuch(what, id);
}
