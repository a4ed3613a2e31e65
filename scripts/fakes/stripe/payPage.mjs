import { bodyOf, escape, page, sendPage } from "../page.mjs";
import { ApiError } from "./ApiError.mjs";
import { sessionOf } from "./api.mjs";
import { parseForm } from "./parseForm.mjs";
import { completeSession, expireSession } from "./sessions.mjs";

const TITLE = "Local stand-in for the card page";
// The hosted page waits that long for the product to hear of a payment before it sends the person back.
const LONGEST_WAIT_MS = 10_000;

/** The page a person is sent to for paying: shows what is owed and lets them choose what happens. */
export async function answerPayPage(request, response, context, id) {
  try {
    const kept = sessionOf(context.store, id);
    if (request.method !== "POST") return sendPage(response, 200, pageOf(kept));
    const { act } = parseForm(await bodyOf(request));
    if (act === "pay") return await pay(response, context, kept);
    if (act === "decline") return sendPage(response, 200, pageOf(kept, "The card was declined. Nothing was paid."));
    if (act === "expire") expire(context, kept);
    response.writeHead(303, { location: kept.session.cancel_url ?? kept.session.success_url }).end();
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    sendPage(response, error.status, page(TITLE, `<p>${escape(error.message)}</p>`));
  }
}

async function pay(response, { store, webhooks }, { session, apiVersion }) {
  completeSession(session);
  store.save();
  const told = webhooks.emit("checkout.session.completed", session, apiVersion);
  await Promise.race([told, new Promise((resolve) => setTimeout(resolve, LONGEST_WAIT_MS).unref())]);
  const back = session.success_url.replaceAll("{CHECKOUT_SESSION_ID}", session.id);
  response.writeHead(303, { location: back }).end();
}

function expire({ webhooks }, { session, apiVersion }) {
  expireSession(session);
  void webhooks.emit("checkout.session.expired", session, apiVersion);
}

function pageOf({ session, lines }, notice) {
  const rows = lines.map(
    (line) =>
      `<tr><td>${escape(line.description)}</td><td>${line.quantity}</td>` +
      `<td class="amount">${money(line.amount_total, line.currency)}</td></tr>`,
  );
  const body = [
    notice ? `<p role="status">${escape(notice)}</p>` : "",
    "<p>No card and no money are involved: this page runs on this machine and stands in for a hosted one.</p>",
    `<table><thead><tr><th>What</th><th>Number</th><th class="amount">Amount</th></tr></thead><tbody>${rows.join("")}`,
    `<tr><td><b>To pay</b></td><td></td><td class="amount"><b>${money(session.amount_total, session.currency)}</b></td>`,
    "</tr></tbody></table>",
    session.customer_email ? `<p>For ${escape(session.customer_email)}</p>` : "",
    session.status === "open" ? CHOICES : `<p role="status">This payment is ${escape(session.status)}.</p>`,
  ];
  return page(TITLE, body.join(""));
}

const choice = (act, text) => `<button name="act" value="${act}">${text}</button>`;
const CHOICES = `<form method="post">${[
  choice("pay", "Pay: the card is good"),
  choice("decline", "Pay: the card is declined"),
  choice("leave", "Walk away; the payment stays open"),
  choice("expire", "Walk away; the payment expires"),
].join("")}</form>`;

// Every currency in use here has hundredths.
const money = (amount, currency) => `${currency.toUpperCase()}&nbsp;${(amount / 100).toFixed(2)}`;
