import { createHmac } from "node:crypto";
import { newId, nowS } from "./sessions.mjs";

const LONGEST_PAUSE_MS = 30_000;
const MOST_TRIES = 200;

/** Tells the product what happened, signed, again and again until it answers with a 2xx; survives a restart. */
export class Webhooks {
  #store;
  #url;
  #secret;

  constructor(store, url, secret) {
    [this.#store, this.#url, this.#secret] = [store, url, secret];
  }

  /** Picks up what an earlier run did not get rid of. */
  resume() {
    for (const event of Object.values(this.#store.events)) if (event.pending_webhooks > 0) void this.#deliver(event, 1);
  }

  /** @returns a promise that is kept after the first delivery, whatever came of it */
  emit(type, object, apiVersion) {
    const event = {
      id: newId("evt"),
      object: "event",
      api_version: apiVersion,
      created: nowS(),
      data: { object: structuredClone(object) },
      livemode: false,
      pending_webhooks: 1,
      request: { id: null, idempotency_key: null },
      type,
    };
    this.#store.events[event.id] = event;
    this.#store.save();
    return this.#deliver(event, 1);
  }

  async #deliver(event, tries) {
    if (await this.#post(event)) {
      event.pending_webhooks = 0;
      return this.#store.save();
    }
    if (tries < MOST_TRIES) {
      setTimeout(() => void this.#deliver(event, tries + 1), Math.min(250 * 2 ** tries, LONGEST_PAUSE_MS));
    }
  }

  async #post(event) {
    const body = JSON.stringify(event);
    const headers = { "content-type": "application/json", "stripe-signature": this.#sign(body) };
    try {
      const answer = await fetch(this.#url, { method: "POST", body, headers, signal: AbortSignal.timeout(10_000) });
      console.log(`${event.type} ${event.id}: ${answer.status}`);
      return answer.ok;
    } catch (error) {
      console.log(`${event.type} ${event.id}: ${error.message}`);
      return false;
    }
  }

  /** The scheme of the hosted service: time and HMAC SHA-256 over `time.body`. */
  #sign(body) {
    const time = nowS();
    return `t=${time},v1=${createHmac("sha256", this.#secret).update(`${time}.${body}`).digest("hex")}`;
  }
}
