/**
 * Mean of a list; a second sum over what is left of the first mean takes its rounding away.
 * @throws RangeError when it is empty
 */
export function mean(values: ArrayLike<number>): number {
  if (values.length === 0) throw new RangeError("mean: at least one value");
  let sum = 0;
  for (let n = 0; n < values.length; n++) sum += values[n];
  const first = sum / values.length;
  let rest = 0;
  for (let n = 0; n < values.length; n++) rest += values[n] - first;
  return first + rest / values.length;
}

/** Standard deviation of a sample, divided by N - 1. @throws RangeError below two values */
export function standardDeviation(values: ArrayLike<number>): number {
  if (values.length < 2) throw new RangeError(`standardDeviation: at least two values, got ${values.length}`);
  const middle = mean(values);
  let squares = 0;
  for (let n = 0; n < values.length; n++) squares += (values[n] - middle) * (values[n] - middle);
  return Math.sqrt(squares / (values.length - 1));
}

/**
 * Middle of the sorted values, the mean of the two middle ones for an even number.
 * @throws RangeError when it is empty
 */
export function median(values: ArrayLike<number>): number {
  if (values.length === 0) throw new RangeError("median: at least one value");
  const sorted = Float64Array.from(values).sort();
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
}

const NORMAL_OVER_MEDIAN = 1.4826022185056018; // standard deviation of a normal law over its median distance

/**
 * Spread that outliers do not move: median distance from the median, times 1.4826 so that it is the standard deviation
 * of a normal law. Hampel, "The influence curve and its role in robust estimation" (1974).
 */
export const robustDeviation = (values: ArrayLike<number>): number => robustSpread(values).deviation;

/** The median and that spread at once, with one sort: the distances grow outwards from the middle on either side. */
export function robustSpread(values: ArrayLike<number>): { middle: number; deviation: number } {
  if (values.length === 0) throw new RangeError("robustSpread: at least one value");
  const sorted = Float64Array.from(values).sort();
  const count = sorted.length;
  const half = count >> 1;
  const middle = count % 2 === 1 ? sorted[half] : (sorted[half - 1] + sorted[half]) / 2;
  let [below, above] = [half - 1, half];
  let [last, before] = [0, 0];
  for (let n = 0; n <= half; n++) {
    before = last;
    const nearerBelow = above >= count || (below >= 0 && middle - sorted[below] < sorted[above] - middle);
    last = nearerBelow ? middle - sorted[below--] : sorted[above++] - middle;
  }
  return { middle, deviation: NORMAL_OVER_MEDIAN * (count % 2 === 1 ? last : (before + last) / 2) };
}

/** Straight line through points by least squares. @throws RangeError unless two places differ */
export function fitLine(x: ArrayLike<number>, y: ArrayLike<number>): { slope: number; intercept: number } {
  if (x.length !== y.length || x.length < 2)
    throw new RangeError(`fitLine: equal lengths from 2, got ${x.length}, ${y.length}`);
  const [meanX, meanY] = [mean(x), mean(y)];
  let [across, along] = [0, 0];
  for (let n = 0; n < x.length; n++) {
    across += (x[n] - meanX) * (x[n] - meanX);
    along += (x[n] - meanX) * (y[n] - meanY);
  }
  if (!(across > 0)) throw new RangeError("fitLine: two different places at least");
  return { slope: along / across, intercept: meanY - (along / across) * meanX };
}
