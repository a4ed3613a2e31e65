import { cosTurns } from "@/lib/numeric/elementary";
import { findRoot } from "@/lib/numeric/findRoot";
import type { CorrelationShape } from "./correlationShape";

/**
 * Error in chips that one reflection makes in a code loop with coherent early-minus-late discriminator, BPSK, no
 * filter. Closed form from the triangle's geometry; the same envelopes as in van Nee and in Braasch.
 * @param ratio amplitude of the reflection to the direct signal, above 0 in phase and below 0 in opposite phase,
 *   |ratio| < 1
 * @param delayChips of the reflection behind the direct signal, from 0
 * @param spacingChips early to late, above 0 up to 1
 * @returns above 0 when the code is measured late
 */
export function multipathErrorChips(ratio: number, delayChips: number, spacingChips: number): number {
  checkRay(ratio, delayChips);
  if (!(spacingChips > 0 && spacingChips <= 1))
    throw new RangeError(`multipathErrorChips: spacing above 0 up to 1 chip, got ${spacingChips}`);
  if (delayChips <= (spacingChips * (1 + ratio)) / 2) return (ratio * delayChips) / (1 + ratio);
  if (delayChips <= 1 + ((ratio - 1) * spacingChips) / 2) return (ratio * spacingChips) / 2;
  if (delayChips < 1 + spacingChips / 2) return (ratio * (1 + spacingChips / 2 - delayChips)) / (2 - ratio);
  return 0;
}

/** Flat top of that envelope in chips: ratio times half of the spacing. */
export const multipathPlateauChips = (ratio: number, spacingChips: number): number => (ratio * spacingChips) / 2;

/** A code discriminator by the shape of the correlation, and a reflection. */
export type ReflectedSignal = {
  shape: CorrelationShape;
  spacingChips: number;
  /** Amplitude to the direct signal, with the sign of the cosine of its phase. */
  ratio: number;
  delayChips: number;
};

/**
 * Early minus late against the replica's error in chips: what a coherent code loop drives to 0. The replica is late
 * above 0. Definition.
 */
export function earlyMinusLate(
  { shape, spacingChips, ratio, delayChips }: ReflectedSignal,
  errorChips: number,
): number {
  const half = spacingChips / 2;
  const direct = shape(errorChips - half) - shape(errorChips + half);
  const reflected = shape(errorChips - delayChips - half) - shape(errorChips - delayChips + half);
  return direct + ratio * reflected;
}

/**
 * Early minus late power, |E|^2 - |L|^2, against the replica's error, with the reflection at any phase: the curve of a
 * noncoherent loop. It crosses 0 rising at side peaks of a BOC signal as well. Definition.
 * @param phaseTurns of the reflection to the direct signal; `ratio` is then its amplitude
 */
export function earlyMinusLatePower(
  { shape, spacingChips, ratio, delayChips }: ReflectedSignal,
  phaseTurns: number,
  errorChips: number,
): number {
  const power = (at: number) => {
    const [direct, reflected] = [shape(at), ratio * shape(at - delayChips)];
    return direct * direct + reflected * reflected + 2 * direct * reflected * cosTurns(phaseTurns);
  };
  return power(errorChips - spacingChips / 2) - power(errorChips + spacingChips / 2);
}

const FARTHEST_CHIPS = 1.5;
const STEP_CHIPS = 1 / 256;

/**
 * The error in chips at which such a loop settles: the zero of the discriminator nearest to 0 at which it rises, found
 * to 1e-9 chip. For any modulation and filter.
 * @returns NaN when no such zero lies within 1.5 chips
 */
export function settledErrorChips(signal: ReflectedSignal): number {
  checkRay(signal.ratio, signal.delayChips);
  const of = (errorChips: number) => earlyMinusLate(signal, errorChips);
  const start = of(0);
  if (start === 0) return 0;
  const step = start < 0 ? STEP_CHIPS : -STEP_CHIPS; // towards where a rising curve crosses
  const [towards, away] = [crossing(of, step), crossing(of, -step)];
  return Math.abs(away) < Math.abs(towards) || Number.isNaN(towards) ? away : towards;
}

/** Nearest rising zero from 0 on in one direction. */
function crossing(of: (x: number) => number, step: number): number {
  let value = of(0);
  for (let x = 0; Math.abs(x) <= FARTHEST_CHIPS; x += step) {
    const next = of(x + step);
    const rises = step > 0 ? value < 0 && next >= 0 : value > 0 && next <= 0;
    if (rises) return findRoot(of, x, x + step, 1e-9);
    value = next;
  }
  return NaN;
}

/** Errors in chips for a reflection in phase and in opposite phase, against its delay. */
export type MultipathEnvelope = { delayChips: number; inPhaseChips: number; oppositeChips: number };

/** Envelope of the multipath error over the reflection's delay: every phase in between lies inside it. */
export const multipathEnvelope = (
  shape: CorrelationShape,
  spacingChips: number,
  ratio: number,
  delaysChips: readonly number[],
): MultipathEnvelope[] =>
  delaysChips.map((delayChips) => ({
    delayChips,
    inPhaseChips: settledErrorChips({ shape, spacingChips, ratio, delayChips }),
    oppositeChips: settledErrorChips({ shape, spacingChips, ratio: -ratio, delayChips }),
  }));

function checkRay(ratio: number, delayChips: number): void {
  if (!(Math.abs(ratio) < 1)) throw new RangeError(`reflection: amplitude below the direct signal's, got ${ratio}`);
  if (!(delayChips >= 0)) throw new RangeError(`reflection: delay from 0 chips, got ${delayChips}`);
}
