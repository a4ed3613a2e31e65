import type { SelfLikeness } from "@/lib/gnss/interference/selfLikeness";

const LOST = 0.5; // of the signal's power: less likeness, and it is another part of the signal
const BACK = 0.8;

/**
 * Seconds after which the interference is itself again: the first lag at which its likeness has come back after it was
 * lost. 0 where it never comes back, or was never lost.
 * @param power of the interference, and of the noise that stands in lag 0 alone
 */
export function findRepetition({ stepS, magnitude }: SelfLikeness, power: number, noisePower: number): number {
  if (!(magnitude[0] > noisePower)) return 0;
  let lag = 1;
  while (lag < magnitude.length && magnitude[lag] > LOST * power) lag++;
  while (lag < magnitude.length && magnitude[lag] < BACK * power) lag++;
  if (lag >= magnitude.length) return 0;
  while (lag + 1 < magnitude.length && magnitude[lag + 1] > magnitude[lag]) lag++;
  return (lag + vertex(magnitude, lag)) * stepS;
}

/** Top of the parabola through three neighbours, from the middle one. */
function vertex(values: Float64Array, at: number): number {
  const [before, here, after] = [values[at - 1], values[at], values[at + 1] ?? values[at]];
  const bend = before - 2 * here + after;
  return bend < 0 ? (before - after) / (2 * bend) : 0;
}
