import { robustDeviation, robustSpread } from "@/lib/numeric/statistics";
import type { TimeErrorSeries } from "./timeError";

/**
 * Readings that no neighbour supports, such as a counter that missed its trigger: farther from the median of the
 * readings around than so many of their robust deviations. A step is kept, for half of the window lies beyond it.
 * Hampel filter; Pearson, "Outliers in process modeling and identification" (2002).
 * @param halfWindow readings on each side, from 2
 * @param times robust deviations
 * @param floorNs least deviation assumed, the counter's own resolution
 * @returns indices, lowest first
 */
export function findOutliers(
  { valuesNs }: TimeErrorSeries,
  { halfWindow = 10, times = 8, floorNs = 0.5 }: { halfWindow?: number; times?: number; floorNs?: number } = {},
): number[] {
  if (!(Number.isInteger(halfWindow) && halfWindow >= 2))
    throw new RangeError(`findOutliers: half a window of 2 readings at least, got ${halfWindow}`);
  const found: number[] = [];
  for (let n = 0; n < valuesNs.length; n++) {
    if (Number.isNaN(valuesNs[n])) continue;
    const from = Math.max(0, Math.min(n - halfWindow, valuesNs.length - 2 * halfWindow - 1));
    const around = valuesNs.subarray(from, from + 2 * halfWindow + 1).filter((value) => !Number.isNaN(value));
    const { middle, deviation } = robustSpread(around);
    if (Math.abs(valuesNs[n] - middle) > times * Math.max(floorNs, deviation)) found.push(n);
  }
  return found;
}

/** The series with some readings left out, as missing ones. */
export function leaveOut({ intervalS, valuesNs }: TimeErrorSeries, indices: readonly number[]): TimeErrorSeries {
  const kept = Float64Array.from(valuesNs);
  for (const index of indices) kept[index] = NaN;
  return { intervalS, valuesNs: kept };
}

/**
 * A pulse can only leave on an edge of the receiver's own clock; the receiver says for each pulse how far that edge was
 * from the right time. Taking that off removes the sawtooth. Receivers differ in the sign of what they say.
 * @param saidNs per reading, same length
 * @param sign +1 when the receiver states by how much the pulse comes late, -1 when by how much early
 */
export function takeOffSawtooth(series: TimeErrorSeries, saidNs: Float64Array, sign: 1 | -1): TimeErrorSeries {
  if (saidNs.length !== series.valuesNs.length)
    throw new RangeError(`takeOffSawtooth: ${series.valuesNs.length} values, got ${saidNs.length}`);
  return { ...series, valuesNs: series.valuesNs.map((value, n) => value - sign * saidNs[n]) };
}

/**
 * The sign with which the stated values take the sawtooth off: the one that leaves the smaller robust deviation from
 * reading to reading, in which slow changes do not count. Where a receiver's own word on it is at hand, that wins.
 */
export function likelySawtoothSign(series: TimeErrorSeries, saidNs: Float64Array): 1 | -1 {
  const roughness = (sign: 1 | -1) => {
    const { valuesNs } = takeOffSawtooth(series, saidNs, sign);
    const steps = valuesNs.subarray(1).map((value, n) => value - valuesNs[n]);
    return robustDeviation(steps.filter((step) => !Number.isNaN(step)));
  };
  return roughness(1) <= roughness(-1) ? 1 : -1;
}

/** Standard deviation in ns of a sawtooth that fills a clock period evenly, period/sqrt(12); textbook. */
export const sawtoothDeviationNs = (clockHz: number): number => 1e9 / clockHz / Math.sqrt(12);
