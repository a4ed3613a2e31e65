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
