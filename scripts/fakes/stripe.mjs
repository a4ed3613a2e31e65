// Local stand-in for the hosted card payments: the endpoints the product calls, a page to pay on, signed webhooks.
import { createServer } from "node:http";
import { requiredSetting } from "./requiredSetting.mjs";
import { answerApi } from "./stripe/api.mjs";
import { answerPayPage } from "./stripe/payPage.mjs";
import { expireSession, nowS } from "./stripe/sessions.mjs";
import { Store } from "./stripe/Store.mjs";
import { Webhooks } from "./stripe/Webhooks.mjs";

const store = new Store(requiredSetting("FAKE_STATE"));
const webhooks = new Webhooks(store, requiredSetting("FAKE_WEBHOOK_URL"), requiredSetting("FAKE_WEBHOOK_SECRET"));
const context = { store, webhooks, origin: "" };

const server = createServer((request, response) => {
  const pay = new URL(request.url, context.origin).pathname.match(/^\/pay\/(\w+)$/);
  const answered = pay ? answerPayPage(request, response, context, pay[1]) : answerApi(request, response, context);
  answered.catch((error) => {
    console.error(error);
    response.writeHead(500).end();
  });
});
server.listen(Number(process.env.FAKE_PORT ?? 0), "127.0.0.1", () => {
  context.origin = `http://127.0.0.1:${server.address().port}`;
  console.log(`listening on ${context.origin}`);
  webhooks.resume();
  setInterval(expireOverdue, 5000);
});
process.on("SIGTERM", () => process.exit(0));

function expireOverdue() {
  for (const { session, apiVersion } of Object.values(store.sessions)) {
    if (session.status !== "open" || session.expires_at > nowS()) continue;
    expireSession(session);
    void webhooks.emit("checkout.session.expired", session, apiVersion);
  }
}
