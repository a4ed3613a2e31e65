import { createFft } from "@/lib/numeric/fft";
import type { Chips } from "./shiftRegister";

/**
 * Most that a value may be off a whole number before it is read as one. The error of the transforms is far below: about
 * 1e-15 of the root of the mean square of all values, times the logarithm of the length.
 */
const CLEAR = 0.25;

/**
 * Correlation of two codes at every lag, in whole numbers:
 * - periodic: R[k] = sum over n of a[n] * b[(n + k) mod N];
 * - flipped: the terms whose n + k runs past the end of b change sign, as when the data bit changes between one period of
 *   b and the next.
 *
 * Code lengths such as 1023 are no powers of two, and the transform needs one. Neither is cut, filled up nor resampled:
 * a stands in a transform of at least 2N - 1 points with zeros behind it, b twice in a row (the second time negated for the
 * flipped sum). Lag k then reads b from k to k + N - 1 without coming to the end, so that the first N values of the circular
 * correlation are just the sums above. The periodic sum uses the real, the flipped one the imaginary part of one
 * transform. Values are rounded to whole numbers, which is exact as long as the rounding is clear, and is checked.
 * @param a chips, +1 or -1, length N >= 2
 * @param b chips, +1 or -1, length N
 * @returns N values each, in chips; not normalised
 */
export function exactCorrelation(a: Chips, b: Chips): { periodic: Int32Array; flipped: Int32Array } {
  const length = a.length;
  if (length < 2 || b.length !== length)
    throw new RangeError(`exactCorrelation: equal lengths from 2, got ${a.length}, ${b.length}`);
  const size = transformSize(length);
  const fft = createFft(size);
  const spectrum = spectrumOf(a, size);
  const twice = new Float64Array(2 * size);
  for (let n = 0; n < length; n++) {
    // The imaginary part is negated here because the last transform gives the conjugate.
    twice[2 * n] = b[n] / size;
    twice[2 * n + 1] = -b[n] / size;
    if (n === length - 1) break;
    twice[2 * (n + length)] = b[n] / size;
    twice[2 * (n + length) + 1] = b[n] / size;
  }
  const lags = new Float64Array(2 * size);
  fft.transform(lags, twice);
  timesConjugate(spectrum, spectrum, lags);
  fft.transform(lags, spectrum);
  const periodic = new Int32Array(length);
  const flipped = new Int32Array(length);
  for (let k = 0; k < length; k++) {
    periodic[k] = whole(lags[2 * k]);
    flipped[k] = whole(lags[2 * k + 1]);
  }
  return { periodic, flipped };
}

/** Smallest power of two that holds a code twice but for its last chip. */
export function transformSize(length: number): number {
  let size = 4;
  while (size < 2 * length - 1) size *= 2;
  return size;
}

/** Transform of a code with zeros behind it. */
export function spectrumOf(code: Chips, size: number): Float64Array {
  const padded = new Float64Array(2 * size);
  for (let n = 0; n < code.length; n++) padded[2 * n] = code[n];
  const spectrum = new Float64Array(2 * size);
  createFft(size).transform(spectrum, padded);
  return spectrum;
}

/**
 * out = a * conj(b), value by value. With b the spectrum that is correlated with a, a second transform forwards gives the
 * conjugate of the correlation: the inverse transform of conj(a) * b.
 */
export function timesConjugate(out: Float64Array, a: Float64Array, b: Float64Array): void {
  for (let n = 0; n < out.length; n += 2) {
    const re = a[n] * b[n] + a[n + 1] * b[n + 1];
    out[n + 1] = a[n + 1] * b[n] - a[n] * b[n + 1];
    out[n] = re;
  }
}

function whole(value: number): number {
  const rounded = Math.round(value);
  if (!(Math.abs(value - rounded) < CLEAR))
    throw new RangeError(`exactCorrelation: ${value} is not clearly a whole number; the codes are too long`);
  return rounded;
}
