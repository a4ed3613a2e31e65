import { decibels, PI } from "@/lib/numeric/elementary";
import { findRoot } from "@/lib/numeric/findRoot";
import { fllLimitHz } from "./carrierJitter";
import { dllJitterChips, type CodeLoop } from "./dllJitter";

const LOWEST_DB_HZ = -20;
const HIGHEST_DB_HZ = 120;

/**
 * C/N0 in dB-Hz at which a frequency loop reaches its limit, three sigma = 1/(4T): the exact solution of `fllJitterHz`
 * near the threshold (F = 2). Kaplan & Hegarty, "Understanding GPS", 2nd edition, 5.6.2 (from memory).
 */
export function fllThresholdDbHz(loopHz: number, coherentS: number): number {
  const limit = 2 * PI * coherentS * fllLimitHz(coherentS);
  // limit^2 c^2 - 4 F B c - 4 F B/T = 0 in c = C/N0
  const square = limit * limit;
  const push = 8 * loopHz;
  return decibels((push + Math.sqrt(push * push + (4 * square * push) / coherentS)) / (2 * square));
}

/**
 * Room in chips until a code loop's error budget is used up: D/2 less three sigma and the stress. Below 0 the loop is
 * expected to lose lock. Rule of thumb, Kaplan & Hegarty, 2nd edition, 5.6.3 (from memory).
 */
export const codeMarginChips = (jitterChips: number, stressChips: number, spacingChips: number): number =>
  spacingChips / 2 - 3 * jitterChips - Math.abs(stressChips);

/** C/N0 in dB-Hz at which the jitter alone uses up that budget; solved on `dllJitterChips` to 1e-6 dB. */
export const dllThresholdDbHz = (
  loop: Omit<CodeLoop, "cn0DbHz">,
  chipRateHz: number,
  frontEndHz: number | null,
): number =>
  findRoot(
    (cn0DbHz) => codeMarginChips(dllJitterChips({ ...loop, cn0DbHz }, chipRateHz, frontEndHz), 0, loop.spacingChips),
    LOWEST_DB_HZ,
    HIGHEST_DB_HZ,
    1e-6,
  );

/**
 * Phase jitter in degrees, 1 sigma, that the reference oscillator adds: 144 sigma_A f/Bn at order 2, 160 at order 3,
 * sigma_A its Allan deviation over 1/Bn. Kaplan & Hegarty, 2nd edition, 5.6.1.3 (from memory).
 */
export const oscillatorJitterDeg = (order: 2 | 3, allanDeviation: number, loopHz: number, carrierHz: number): number =>
  ((order === 2 ? 144 : 160) * allanDeviation * carrierHz) / loopHz;

/**
 * Phase jitter in degrees, 1 sigma, of an oscillator shaken evenly over a band: (360 f/2 pi) S sqrt(P (1/f1 - 1/f2)).
 * Kaplan & Hegarty, 2nd edition, 5.6.1.2 (from memory).
 * @param perG change of frequency per g, 1e-9 for a part in 10^9
 * @param densityG2Hz power of the vibration in g^2/Hz between the two frequencies
 */
export const vibrationJitterDeg = (
  carrierHz: number,
  perG: number,
  densityG2Hz: number,
  fromHz: number,
  toHz: number,
): number => ((360 * carrierHz * perG) / (2 * PI)) * Math.sqrt(densityG2Hz * (1 / fromHz - 1 / toHz));
