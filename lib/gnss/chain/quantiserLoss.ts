import { decibels, exp, PI } from "@/lib/numeric/elementary";
import { erfc } from "@/lib/numeric/erfc";
import { findMaximum } from "@/lib/numeric/findMaximum";

/**
 * Share of a weak signal's power-to-noise ratio that is left after a converter with equal steps, samples independent:
 * eta = (sum of phi(t_k))^2 / E[y^2], t_k the thresholds in sigma and y the levels in steps. Two levels keep 2/pi.
 * Hegarty, "Analytical model for GNSS receiver implementation losses", Navigation 58(1), 2011.
 * @param levels whole number from 2; with an even number 0 is a threshold, with an odd number a level
 * @param stepSigma between thresholds, in standard deviations of the noise; without meaning for two levels
 */
export function quantiserEfficiency(levels: number, stepSigma: number): number {
  if (!(Number.isInteger(levels) && levels >= 2))
    throw new RangeError(`quantiserEfficiency: whole number of levels from 2, got ${levels}`);
  if (!(stepSigma > 0)) throw new RangeError(`quantiserEfficiency: step above 0 sigma, got ${stepSigma}`);
  let slope = 0;
  let power = 0;
  let above = 1; // probability to exceed the threshold below the level
  for (let k = 0; k < levels; k++) {
    const threshold = (k + 1 - levels / 2) * stepSigma;
    const next = k === levels - 1 ? 0 : erfc(threshold * Math.SQRT1_2) / 2;
    if (k < levels - 1) slope += exp((-threshold * threshold) / 2) / Math.sqrt(2 * PI);
    const level = k - (levels - 1) / 2;
    power += level * level * (above - next);
    above = next;
  }
  return (slope * slope) / power;
}

/** Step in sigma that keeps most of the signal; 1 for two levels, where it does not matter. */
export const bestQuantiserStep = (levels: number): number =>
  levels === 2 ? 1 : findMaximum((step) => quantiserEfficiency(levels, step), 1 / levels, 2.5, 1e-7);

/** Loss in dB of a converter of equal steps on a weak signal. */
export const quantiserLossDb = (levels: number, stepSigma: number): number =>
  -decibels(quantiserEfficiency(levels, stepSigma));
