import { runningSums } from "./runningSums";
import type { TimeErrorSeries } from "./timeError";

/** A lasting change of the time error; `index` is the first reading after it. */
export type TimeStep = { index: number; sizeNs: number };

/**
 * The largest lasting change: the place where the means of so many readings before and after differ most. A slow wave
 * hardly moves it as long as the window is short against its period; leave outliers out first (`findOutliers`).
 * @param window readings on each side, from 1
 * @returns null when the series is shorter than two windows or has no reading on one side of every place
 */
export function largestStep({ valuesNs }: TimeErrorSeries, window: number): TimeStep | null {
  if (!(Number.isInteger(window) && window >= 1))
    throw new RangeError(`largestStep: window of 1 reading at least, got ${window}`);
  const { sums, missing } = runningSums(valuesNs);
  const meanOf = (from: number) =>
    (sums[from + window] - sums[from]) / (window - (missing[from + window] - missing[from]));
  let best: TimeStep | null = null;
  for (let n = window; n + window <= valuesNs.length; n++) {
    const sizeNs = meanOf(n) - meanOf(n - window); // NaN where a side has no reading
    if (Number.isNaN(sizeNs)) continue;
    if (best === null || Math.abs(sizeNs) > Math.abs(best.sizeNs)) best = { index: n, sizeNs };
  }
  return best;
}
