/** Weakest difference of two means is looked for over so many readings on either side. */
const HALF_WINDOW = 6;
const AROUND = 4;

/** A step stands between `at - 1` and `at`; positive when it goes up. */
export type Step = { at: number; size: number };

/** Steps of a series that are at least so large, each where the two levels beside it fit best. */
export function findSteps(values: readonly number[], leastSize: number): Step[] {
  const jump = jumpsOf(values);
  const steps: Step[] = [];
  let n = HALF_WINDOW;
  while (n + HALF_WINDOW <= values.length) {
    if (!(Math.abs(jump(n)) >= leastSize)) {
      n++;
      continue;
    }
    let best = n;
    const end = Math.min(n + HALF_WINDOW, values.length - HALF_WINDOW);
    for (let at = n; at <= end; at++) if (Math.abs(jump(at)) > Math.abs(jump(best))) best = at;
    const at = bestFit(values, best);
    steps.push({ at, size: jump(Math.min(Math.max(at, HALF_WINDOW), values.length - HALF_WINDOW)) });
    n = best + HALF_WINDOW;
  }
  return steps;
}

/** Mean of the readings from one on, less that of those before it. */
function jumpsOf(values: readonly number[]): (at: number) => number {
  const sums = [0];
  for (const value of values) sums.push(sums[sums.length - 1] + value);
  return (at) => (sums[at + HALF_WINDOW] - 2 * sums[at] + sums[at - HALF_WINDOW]) / HALF_WINDOW;
}

/** The place near `around` at which two levels leave the least squares. */
function bestFit(values: readonly number[], around: number): number {
  const from = Math.max(0, around - HALF_WINDOW - AROUND);
  const to = Math.min(values.length, around + HALF_WINDOW + AROUND);
  let best = around;
  let least = Infinity;
  for (let at = Math.max(from + 1, around - AROUND); at <= Math.min(to - 1, around + AROUND); at++) {
    const left = squaresAbout(values, from, at) + squaresAbout(values, at, to);
    if (left < least) [least, best] = [left, at];
  }
  return best;
}

function squaresAbout(values: readonly number[], from: number, to: number): number {
  let [sum, squares] = [0, 0];
  for (let n = from; n < to; n++) {
    sum += values[n];
    squares += values[n] * values[n];
  }
  return squares - (sum * sum) / (to - from);
}
