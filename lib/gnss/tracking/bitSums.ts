import { atan2, cosTurns, PI, sinTurns } from "@/lib/numeric/elementary";

/**
 * Sums of prompts over whole data bits.
 * @param prompts complex sums of code periods, real and imaginary parts alternating
 * @param edge code period at which a bit begins
 * @returns real and imaginary parts alternating, a pair a bit; the part of a bit at either end is left out
 */
export function bitSums(prompts: ArrayLike<number>, edge: number, periodsPerBit: number): Float64Array {
  const bits = Math.max(0, Math.floor((prompts.length / 2 - edge) / periodsPerBit));
  const sums = new Float64Array(2 * bits);
  for (let n = 0; n < bits * periodsPerBit; n++) {
    const bit = Math.floor(n / periodsPerBit);
    sums[2 * bit] += prompts[2 * (edge + n)];
    sums[2 * bit + 1] += prompts[2 * (edge + n) + 1];
  }
  return sums;
}

/**
 * Frequency in Hz left in sums over data bits: their squares have lost the bits, and turn by twice the frequency from one
 * to the next. Range +-1/(4 T), 12.5 Hz for bits of 20 ms. From sums of whole bits it is far surer than from single
 * periods: squaring costs little once a sum stands clear of the noise.
 */
export function bitFrequencyHz(sums: ArrayLike<number>, bitS: number): number {
  let [dot, cross] = [0, 0];
  let [beforeRe, beforeIm] = [0, 0];
  for (let at = 0; at < sums.length; at += 2) {
    const [re, im] = [sums[at] * sums[at] - sums[at + 1] * sums[at + 1], 2 * sums[at] * sums[at + 1]];
    dot += beforeRe * re + beforeIm * im;
    cross += beforeRe * im - beforeIm * re;
    [beforeRe, beforeIm] = [re, im];
  }
  return atan2(cross, dot) / (4 * PI * bitS);
}

/** Prompts with a constant frequency taken out. */
export function turnedBack(prompts: ArrayLike<number>, frequencyHz: number, periodS: number): Float64Array {
  const turned = new Float64Array(prompts.length);
  for (let n = 0; n < prompts.length / 2; n++) {
    const turns = -frequencyHz * periodS * n;
    const [c, s] = [cosTurns(turns), sinTurns(turns)];
    turned[2 * n] = prompts[2 * n] * c - prompts[2 * n + 1] * s;
    turned[2 * n + 1] = prompts[2 * n] * s + prompts[2 * n + 1] * c;
  }
  return turned;
}
