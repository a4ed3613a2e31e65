import type { Finding } from "./markNumber";

/** The commonest error of a Doppler, and the sentence that goes with it. */
export function wrongSign(value: number, computedHz: number, toleranceHz: number): Finding | null {
  if (!(Math.abs(value + computedHz) <= toleranceHz)) return null;
  const side = computedHz < 0 ? "below" : "above";
  const sign = computedHz < 0 ? "negative" : "positive";
  return {
    errorClass: "sign",
    reason: `The size agrees; the sign does not. Received frequency is ${side} 1\u2009575.42\u00a0MHz, so the Doppler is ${sign}.`,
  };
}
