import { chipsOf, type Chips, type Levels } from "./shiftRegister";

/**
 * Legendre sequence of a prime length: 1 where the place is a square modulo the length, else 0; place 0 gives 0. Squares
 * are counted, not tested one by one: half of the places squared are all there are.
 * @param prime odd prime, at most 65,521 so that a square stays a whole number below 2^32
 */
export function legendreSequence(prime: number): Levels {
  if (!isOddPrime(prime)) throw new RangeError(`legendreSequence: odd prime up to 65521, got ${prime}`);
  const levels = new Uint8Array(prime);
  for (let root = 1; root <= (prime - 1) / 2; root++) levels[(root * root) % prime] = 1;
  return levels;
}

/**
 * Weil sequence: a Legendre sequence plus (modulo 2) itself, read `index` places later. No two members,
 * and no member shifted, correlate beyond 2 sqrt(N) + 5 (Rushanan, "Weil sequences: a family of binary sequences with good
 * correlation properties", 2006; from memory).
 * @param index 1 to (prime - 1)/2; larger ones repeat the family in another order
 */
export function weilSequence(prime: number, index: number): Levels {
  const legendre = legendreSequence(prime);
  if (!Number.isInteger(index) || index < 1 || index > (prime - 1) / 2)
    throw new RangeError(`weilSequence: index from 1 to ${(prime - 1) / 2}, got ${index}`);
  return legendre.map((level, n) => level ^ legendre[(n + index) % prime]);
}

/** The same as chips. */
export const weilCode = (prime: number, index: number): Chips => chipsOf(weilSequence(prime, index));

function isOddPrime(number: number): boolean {
  if (!Number.isInteger(number) || number < 3 || number > 65_521 || number % 2 === 0) return false;
  for (let factor = 3; factor * factor <= number; factor += 2) if (number % factor === 0) return false;
  return true;
}
