import { decibels } from "@/lib/numeric/elementary";

const STEPS_PER_CHIP = 480; // 0.6 m of a 1.023 MHz chip; a multiple of the corners of all subcarriers in use

/** A place beside the main peak on which a loop can come to rest. */
export type SidePeak = {
  /** Above 0; the shape is even, so there is one at the opposite delay too. */
  delayChips: number;
  /** Signed, against 1 for the main peak. */
  level: number;
  /** Below 0. */
  levelDb: number;
};

/**
 * Side peaks of a correlation shape: where its magnitude is higher than on both sides, in order of the delay. Exact to the
 * grid of 1/480 chip, on which all corners of an unfiltered BOC lie.
 * @param shape value against the delay in chips, even, largest at 0; filtered or not
 * @param lowest magnitude against the main peak below which nothing is listed: a filter rings on for ever
 */
export function sidePeaks(shape: (delayChips: number) => number, lowest = 0.02): SidePeak[] {
  const main = Math.abs(shape(0));
  const peaks: SidePeak[] = [];
  const magnitude = (step: number) => Math.abs(shape(step / STEPS_PER_CHIP));
  for (let step = 1; step <= 2 * STEPS_PER_CHIP; step++) {
    const here = magnitude(step);
    if (here < lowest * main || here <= magnitude(step - 1) || here < magnitude(step + 1)) continue;
    const level = shape(step / STEPS_PER_CHIP) / main;
    peaks.push({ delayChips: step / STEPS_PER_CHIP, level, levelDb: 2 * decibels(Math.abs(level)) });
  }
  return peaks;
}
