import type { CorrelationShape } from "@/lib/gnss/tracking/correlationShape";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { NEAREST_SIDE_CHIPS, readPeaks, type Peaks } from "./readPeaks";

/** One reflection beside the direct signal: amplitude against it, extra path, phase. */
export type Reflection = { ratio: number; extraChips: number; turns: number };

export type ReflectedShape = {
  /** Real and imaginary part against the delay from the direct signal's; 1 for that at 0. */
  at(delayChips: number): [number, number];
  /** Null where one of the three peaks does not stand out: only what is plain to the eye is asked. */
  peaksAt(directLagChips: number): Peaks | null;
};

const REACH_CHIPS = 1.5;
const FINE_CHIPS = 0.001;
const COUNTED_LEVEL = 0.15; // of the main peak: lower ripples are the filter's
const LEAST_MAIN = 1.2; // over either side peak, 1.6 dB: noise must not turn the order round
const LEAST_SIDE = 0.28; // of the main peak, 11 dB below

/** Direct signal and one reflection, as a correlator adds them up. */
export function reflectedShape(shape: CorrelationShape, { ratio, extraChips, turns }: Reflection): ReflectedShape {
  const [re, im] = [ratio * cosTurns(turns), ratio * sinTurns(turns)];
  const at = (delayChips: number): [number, number] => {
    const reflected = shape(delayChips - extraChips);
    return [shape(delayChips) + re * reflected, im * reflected];
  };
  const magnitudes = Array.from({ length: 2 * (REACH_CHIPS / FINE_CHIPS) + 1 }, (_, n) => {
    const [real, imaginary] = at(n * FINE_CHIPS - REACH_CHIPS);
    return Math.sqrt(real * real + imaginary * imaginary);
  });
  return {
    at,
    peaksAt(directLagChips) {
      const peaks = readPeaks(magnitudes, directLagChips - REACH_CHIPS, FINE_CHIPS);
      return isPlain(peaks, magnitudes) ? peaks : null;
    },
  };
}

/** Three tops and no other, the highest clear of the two beside it. */
function isPlain({ main, earlier, later }: Peaks, magnitudes: readonly number[]): boolean {
  const tops = magnitudes.filter(
    (value, n) =>
      value > COUNTED_LEVEL * main.level &&
      value > (magnitudes[n - 1] ?? value) &&
      value >= (magnitudes[n + 1] ?? value),
  );
  const clear = [earlier, later].every(
    ({ lagChips, level }) =>
      Math.abs(lagChips - main.lagChips) > NEAREST_SIDE_CHIPS + FINE_CHIPS &&
      main.level >= LEAST_MAIN * level &&
      level >= LEAST_SIDE * main.level,
  );
  return tops.length === 3 && clear;
}
