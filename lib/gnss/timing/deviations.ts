import { runningSums } from "./runningSums";
import type { TimeErrorSeries } from "./timeError";

/*
 * Deviations of a time error x by its second differences over n intervals of tau0, all that overlap: ITU-T G.810, II.1
 * to II.3; the same estimators as in Riley, "Handbook of Frequency Stability Analysis", NIST SP 1065 (2008), 5.2. A
 * difference that a missing reading enters is left out.
 */

/**
 * Allan deviation: sqrt(sum of (x[i+2n] - 2 x[i+n] + x[i])^2 / (2 n^2 tau0^2 count)); G.810, II.1.
 * @param intervals n, from 1 to (N - 1)/2
 * @returns fractional frequency, no unit; NaN when no difference is complete
 */
export function allanDeviation({ intervalS, valuesNs }: TimeErrorSeries, intervals: number): number {
  checkIntervals("allanDeviation", intervals, Math.floor((valuesNs.length - 1) / 2));
  let [sum, count] = [0, 0];
  for (let i = 0; i + 2 * intervals < valuesNs.length; i++) {
    const difference = valuesNs[i + 2 * intervals] - 2 * valuesNs[i + intervals] + valuesNs[i];
    if (Number.isNaN(difference)) continue;
    sum += difference * difference;
    count += 1;
  }
  return count === 0 ? NaN : (Math.sqrt(sum / (2 * count)) / (intervals * intervalS)) * 1e-9;
}

/**
 * Time deviation in ns: the second differences of means over n readings; sqrt(sum of (inner sum)^2 / (6 n^2 count)).
 * G.810, II.3. Offset and frequency offset fall out of it; a steady drift does not.
 * @param intervals n, from 1 to N/3
 */
export function timeDeviationNs({ valuesNs }: TimeErrorSeries, intervals: number): number {
  checkIntervals("timeDeviationNs", intervals, Math.floor(valuesNs.length / 3));
  const { sums, missing } = runningSums(valuesNs);
  const meanSum = (from: number) => sums[from + intervals] - sums[from];
  let [sum, count] = [0, 0];
  for (let j = 0; j + 3 * intervals <= valuesNs.length; j++) {
    if (missing[j + 3 * intervals] !== missing[j]) continue;
    const difference = meanSum(j + 2 * intervals) - 2 * meanSum(j + intervals) + meanSum(j);
    sum += difference * difference;
    count += 1;
  }
  return count === 0 ? NaN : Math.sqrt(sum / (6 * count)) / intervals;
}

/** Modified Allan deviation, sqrt(3) TDEV/tau; G.810, II.2. No unit. */
export const modifiedAllanDeviation = (series: TimeErrorSeries, intervals: number): number =>
  (Math.sqrt(3) * timeDeviationNs(series, intervals) * 1e-9) / (intervals * series.intervalS);

function checkIntervals(name: string, intervals: number, most: number): void {
  if (!(Number.isInteger(intervals) && intervals >= 1 && intervals <= most))
    throw new RangeError(`${name}: 1 to ${most} intervals, got ${intervals}`);
}

/** Numbers of intervals at which to state a curve: 1, 2, 5, 10 ... up to the largest allowed. */
export function usualIntervals(most: number): number[] {
  const list: number[] = [];
  for (let decade = 1; decade <= most; decade *= 10)
    for (const step of [1, 2, 5]) if (step * decade <= most) list.push(step * decade);
  return list;
}
