import type { TimeErrorSeries } from "./timeError";

/**
 * Maximum time interval error in ns: the largest peak-to-peak of the time error inside any window of n intervals (n + 1
 * readings). ITU-T G.810, 4.5.13 and II.5. Missing readings count for nothing; a window without two readings is left
 * out. Linear time for each window by two queues of candidates.
 * @param intervals n, from 1 to N - 1
 */
export function mtieNs({ valuesNs }: TimeErrorSeries, intervals: number): number {
  if (!(Number.isInteger(intervals) && intervals >= 1 && intervals < valuesNs.length))
    throw new RangeError(`mtieNs: 1 to ${valuesNs.length - 1} intervals, got ${intervals}`);
  const high = createQueue(valuesNs, (a, b) => a >= b);
  const low = createQueue(valuesNs, (a, b) => a <= b);
  let largest = 0;
  for (let n = 0; n < valuesNs.length; n++) {
    if (Number.isNaN(valuesNs[n])) continue;
    const range = high.push(n, n - intervals) - low.push(n, n - intervals);
    if (range > largest) largest = range;
  }
  return largest;
}

/** Best value among the latest readings: each that a later one beats is forgotten. */
function createQueue(values: Float64Array, beats: (a: number, b: number) => boolean) {
  const indices = new Int32Array(values.length);
  let [first, end] = [0, 0];
  const push = (index: number, oldest: number): number => {
    while (end > first && beats(values[index], values[indices[end - 1]])) end -= 1;
    indices[end++] = index;
    while (indices[first] < oldest) first += 1;
    return values[indices[first]];
  };
  return { push };
}
