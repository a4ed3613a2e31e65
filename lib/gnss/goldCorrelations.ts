import { exactCorrelation } from "./exactCorrelation";
import { shiftAndAdd } from "./shiftAndAdd";
import { chipsOf, registerSequence } from "./shiftRegister";

/**
 * Periodic correlations of all pairs of one Gold family, in whole numbers and in the order of `allCorrelations`, without
 * correlating them. With c_i[n] = a[n] * b[n + d_i] and the shift-and-add property of both parents,
 *   c_i[n] * c_j[n + k] = a[n + s_a(k)] * b[n + d_i + s_b(k + d_j - d_i)],
 * so the sum over n is the correlation X of the parents at the lag d_i + s_b(k + d_j - d_i) - s_a(k): a look-up. Where one of
 * the parents falls out (k = 0, or k = d_i - d_j) the sum is that of the other one over a period, -1; where both do it
 * is N.
 * @param first polynomial of a, as for `goldCode`; primitive, like the second
 * @param second polynomial of b, of the same degree
 * @param shifts d_i of each code, chips, 0 to 2^n - 2
 * @param result where to write, M * M * N values
 */
export function goldCorrelations(
  first: number,
  second: number,
  shifts: readonly number[],
  result?: Int16Array,
): Int16Array {
  const [sumsA, sumsB] = [Int16Array.from(shiftAndAdd(first)), shiftAndAdd(second)];
  const length = sumsA.length;
  if (sumsB.length !== length || length > 8191)
    throw new RangeError(`goldCorrelations: one degree up to 13, got lengths ${length}, ${sumsB.length}`);
  if (shifts.some((shift) => !Number.isInteger(shift) || shift < 0 || shift >= length))
    throw new RangeError(`goldCorrelations: shifts from 0 to ${length - 1}, got ${shifts.join()}`);
  const count = shifts.length;
  const out = result ?? new Int16Array(count * count * length);
  if (out.length !== count * count * length)
    throw new RangeError(`goldCorrelations: ${count * count * length} places for the result, got ${out.length}`);
  const parents = parentsTwice(first, second);
  const later = new Int16Array(2 * length);
  for (let i = 0; i < count; i++) {
    // d_i + s_b(k) from 0 to N - 1, and N on top so that the difference below is no negative place; twice in a row.
    for (let m = 0; m < length; m++) {
      const lag = shifts[i] + sumsB[m];
      later[m] = later[m + length] = lag < length ? lag + length : lag;
    }
    for (let j = i; j < count; j++) {
      const [row, mirrored] = [(i * count + j) * length, (j * count + i) * length];
      const apart = (shifts[j] - shifts[i] + length) % length;
      lookUp(out, parents, later, sumsA, { row, mirrored, apart });
      out[row] = out[mirrored] = apart === 0 ? length : -1;
      if (apart > 0) out[row + length - apart] = out[mirrored + apart] = -1;
    }
  }
  return out;
}

/** X[t] = sum over n of a[n] * b[(n + t) mod N], at place t + N for t from -N to N - 1. */
function parentsTwice(first: number, second: number): Int16Array {
  const once = exactCorrelation(chipsOf(registerSequence(first)), chipsOf(registerSequence(second))).periodic;
  const twice = new Int16Array(2 * once.length);
  twice.set(once);
  twice.set(once, once.length);
  return twice;
}

function lookUp(
  out: Int16Array,
  parents: Int16Array,
  later: Int16Array,
  sumsA: Int16Array,
  { row, mirrored, apart }: { row: number; mirrored: number; apart: number },
): void {
  const length = sumsA.length;
  const back = mirrored + length;
  // N - 1 is even, and two lags a turn are a sixth faster than one.
  for (let k = 1; k < length; k += 2) {
    const value = parents[later[k + apart] - sumsA[k]];
    const next = parents[later[k + 1 + apart] - sumsA[k + 1]];
    out[row + k] = value;
    out[row + k + 1] = next;
    out[back - k] = value;
    out[back - k - 1] = next;
  }
}
