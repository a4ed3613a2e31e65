import type { Chips } from "./shiftRegister";

/**
 * Circular correlation R[k] = sum over n of a[n] * b[(n + k) mod N], by direct summation in whole numbers: exact for any
 * length, 1023 included, in about N^2 additions (1 to 2 ms for a C/A code). Searches over many samples use `createDft`.
 * @param a chips, +1 or -1, length N >= 1
 * @param b chips, +1 or -1, length N
 * @returns length N, in chips; R[0] is zero delay; not normalised
 * @throws RangeError when the lengths differ or are zero
 */
export function circularCorrelation(a: Chips, b: Chips): Int32Array {
  const length = a.length;
  if (length === 0 || b.length !== length)
    throw new RangeError(`circularCorrelation: equal lengths above 0, got ${a.length}, ${b.length}`);
  const twice = new Int8Array(2 * length); // saves the modulo in the inner loop
  twice.set(b);
  twice.set(b, length);
  const result = new Int32Array(length);
  for (let k = 0; k < length; k++) {
    let sum = 0;
    for (let n = 0; n < length; n++) sum += a[n] * twice[n + k];
    result[k] = sum;
  }
  return result;
}
