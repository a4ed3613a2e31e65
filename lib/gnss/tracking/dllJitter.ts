import { cosTurns, PI, pow10Db, sinTurns } from "@/lib/numeric/elementary";
import { integrateBand } from "../spectra/integrateBand";
import type { Modulation } from "../spectra/modulation";
import { powerSpectralDensity } from "../spectra/powerSpectralDensity";

/** A code loop on an early-minus-late power discriminator, and the signal it follows. */
export type CodeLoop = {
  /** One-sided noise bandwidth of the loop. */
  loopHz: number;
  /** Early to late, above 0 up to 2 chips. */
  spacingChips: number;
  cn0DbHz: number;
  /** Coherent time of one correlation. */
  coherentS: number;
};

/**
 * Thermal jitter of the code in chips, 1 sigma, BPSK with rectangular chips: Kaplan & Hegarty, "Understanding GPS", 2nd
 * edition, (5.23). Its three cases follow the spacing D against b = B/Rc: from pi/b, between, and up to 1/b, where
 * narrowing D further gains nothing.
 * @param frontEndHz two-sided bandwidth before the correlator; null for none
 */
export function dllJitterChips(loop: CodeLoop, chipRateHz: number, frontEndHz: number | null): number {
  checkCodeLoop(loop);
  const { loopHz, spacingChips: spacing, cn0DbHz, coherentS } = loop;
  const cn0 = pow10Db(cn0DbHz);
  const b = frontEndHz === null ? Infinity : frontEndHz / chipRateHz;
  if (!(b > 0)) throw new RangeError(`dllJitterChips: front-end bandwidth above 0 Hz, got ${frontEndHz}`);
  const squaring = 1 + 2 / (coherentS * cn0 * (2 - spacing));
  if (spacing * b >= PI) return Math.sqrt(((loopHz * spacing) / (2 * cn0)) * squaring);
  if (spacing * b <= 1) return Math.sqrt((loopHz / (2 * cn0 * b)) * (1 + 1 / (coherentS * cn0)));
  const beyond = spacing - 1 / b;
  return Math.sqrt((loopHz / (2 * cn0)) * (1 / b + (b / (PI - 1)) * beyond * beyond) * squaring);
}

/**
 * The same for any modulation behind an ideal filter, by the integrals over its density S(f): Kaplan & Hegarty, 2nd
 * edition, (5.22).
 *   s2 = Bn int S sin^2(pi f D) / (C/N0 (2 pi int f S sin(pi f D))^2)
 *        * [1 + int S cos^2(pi f D) / (T C/N0 (int S cos(pi f D))^2)],  D in s
 * @param frontEndHz two-sided, above 0
 */
export function dllJitterExactChips(loop: CodeLoop, modulation: Modulation, frontEndHz: number): number {
  checkCodeLoop(loop);
  const { loopHz, spacingChips, cn0DbHz, coherentS } = loop;
  const cn0 = pow10Db(cn0DbHz);
  const halfTurnsPerHz = spacingChips / modulation.chipRateHz / 2;
  const over = (weight: (offsetHz: number) => number) =>
    integrateBand((f) => weight(f) * powerSpectralDensity(modulation, f), frontEndHz, [modulation]);
  const sine = (f: number) => sinTurns(f * halfTurnsPerHz);
  const cosine = (f: number) => cosTurns(f * halfTurnsPerHz);
  const slope = 2 * PI * over((f) => f * sine(f));
  const middle = over(cosine);
  const coherent = (loopHz * over((f) => sine(f) * sine(f))) / (cn0 * slope * slope);
  const squaring = 1 + over((f) => cosine(f) * cosine(f)) / (coherentS * cn0 * middle * middle);
  return modulation.chipRateHz * Math.sqrt(coherent * squaring);
}

function checkCodeLoop({ loopHz, spacingChips, coherentS }: CodeLoop): void {
  if (!(loopHz > 0)) throw new RangeError(`code loop: bandwidth above 0 Hz, got ${loopHz}`);
  if (!(spacingChips > 0 && spacingChips < 2))
    throw new RangeError(`code loop: spacing above 0 and below 2 chips, got ${spacingChips}`);
  if (!(coherentS > 0)) throw new RangeError(`code loop: coherent time above 0 s, got ${coherentS}`);
}
