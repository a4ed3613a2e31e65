import { setTimeout as wait } from "node:timers/promises";
import { Refusal } from "./say.mjs";

/** Waits until an address answers at all, whatever it says. @returns the status of the first answer */
export async function waitForAnswer(url, seconds) {
  const end = Date.now() + seconds * 1000;
  while (Date.now() < end) {
    try {
      return (await fetch(url, { redirect: "manual", signal: AbortSignal.timeout(30_000) })).status;
    } catch {
      await wait(100);
    }
  }
  throw new Refusal(`Nothing answers at ${url} after ${seconds} s.`);
}
