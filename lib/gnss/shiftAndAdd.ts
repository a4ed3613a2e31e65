import { registerSequence } from "./shiftRegister";

/**
 * Shift-and-add property of a maximal-length sequence (Golomb, "Shift Register Sequences", 1967): added to itself, read k
 * places later, it is itself again, read s(k) places later. For chips that is m[n] * m[n + k] = m[n + s(k)].
 * @param polynomial as for `registerSequence`, primitive
 * @returns s(k) at k from 1 to 2^n - 2; place 0, where the sum is all zeros, holds -1
 */
export function shiftAndAdd(polynomial: number): Int32Array {
  const levels = registerSequence(polynomial);
  const stages = 31 - Math.clz32(polynomial);
  const length = levels.length;
  const windows = new Int32Array(length);
  let window = 0;
  for (let n = 0; n < length + stages - 1; n++) {
    window = ((window << 1) | levels[n % length]) & length;
    if (n >= stages - 1) windows[n - stages + 1] = window;
  }
  // Each window of as many levels as there are stages occurs once, and tells the place.
  const places = new Int32Array(length + 1).fill(-1);
  windows.forEach((content, place) => {
    if (places[content] !== -1)
      throw new RangeError(`shiftAndAdd: 0o${polynomial.toString(8)} gives no maximal-length sequence`);
    places[content] = place;
  });
  return windows.map((content) => places[content ^ windows[0]]);
}
