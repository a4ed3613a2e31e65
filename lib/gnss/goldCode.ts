import { chipsOf, registerSequence, type Chips } from "./shiftRegister";

/**
 * Gold code: the chip-wise product of two maximal-length codes of equal length, the second read `shift` chips later
 * (Gold, "Optimal binary sequences for spread spectrum multiplexing", 1967). With a preferred pair all members of the
 * family correlate at three values only.
 * @param first polynomial as for `registerSequence`
 * @param second polynomial of the same degree
 * @param shift chips, 0 to 2^n - 2
 */
export function goldCode(first: number, second: number, shift: number): Chips {
  const a = chipsOf(registerSequence(first));
  const b = chipsOf(registerSequence(second));
  if (a.length !== b.length)
    throw new RangeError(`goldCode: polynomials of one degree, got lengths ${a.length}, ${b.length}`);
  if (!Number.isInteger(shift) || shift < 0 || shift >= a.length)
    throw new RangeError(`goldCode: shift from 0 to ${a.length - 1}, got ${shift}`);
  return a.map((chip, n) => chip * b[(n + shift) % b.length]);
}

/**
 * Largest magnitude in chips that two codes of a Gold family reach, t(n) = 2^((n + 1)/2) + 1 for odd n and 2^((n + 2)/2) + 1
 * for even n; the levels are -t, -1 and t - 2 (Gold, 1967).
 * @param stages n, from 3, no multiple of 4: there is no preferred pair then
 */
export function goldBound(stages: number): number {
  if (!Number.isInteger(stages) || stages < 3 || stages > 30 || stages % 4 === 0)
    throw new RangeError(`goldBound: 3 to 30 stages, no multiple of 4, got ${stages}`);
  return (1 << ((stages + (stages % 2 === 1 ? 1 : 2)) / 2)) + 1;
}
