import type { Finding } from "../markNumber";
import type { JammedOrNotTruth } from "./drawCase";
import type { Verdict } from "./quantities";

const SEEN: Readonly<Record<Exclude<Verdict, "faulty">, string>> = {
  jammed: "All satellites fell together and the gain control backed off: more power came in, and none of it ours.",
  deceived:
    "C/N0 rose to one level while the gain control backed off: stronger signals took the place of the true ones, and then pulled clock or position.",
  blocked: "Satellites fell on one side only; gain control, clock and position stayed.",
};

const NAMED: Readonly<Record<string, string>> = {
  "deceived faulty": "C/N0 went up, so taken for better",
  "faulty jammed": "gain control not looked at",
  "jammed faulty": "gain control read the wrong way round",
  "deceived jammed": "power alone looked at",
  "jammed deceived": "power alone looked at",
};

export function explainVerdict({ verdict, event }: JammedOrNotTruth, chosen: string): Finding {
  const own =
    event.gainDb > 0
      ? "All satellites fell together and the gain control opened: less came from our own antenna."
      : "Clock and all Dopplers ran together while C/N0 and gain control stayed: our own oscillator.";
  return { errorClass: NAMED[`${verdict} ${chosen}`] ?? null, reason: verdict === "faulty" ? own : SEEN[verdict] };
}
