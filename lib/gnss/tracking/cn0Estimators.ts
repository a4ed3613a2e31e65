import { decibels } from "@/lib/numeric/elementary";

/**
 * C/N0 in dB-Hz by narrow and wide power: mu = sum over blocks of |sum of M prompts|^2 over sum of |prompt|^2, then (mu
 * - 1)/(T (M - mu)). Van Dierendonck, "GPS Receivers", in Parkinson & Spilker, "Global Positioning System: Theory and
 * Applications" I (1996), 8, where mu is the mean of the blocks' own ratios; that reads 0.14 dB low at 27 dB-Hz, the
 * ratio of the sums does not. The blocks must lie inside data bits and the loop must be in phase or frequency lock.
 * @param prompts complex sums of single code periods, real and imaginary parts alternating
 * @param first period to begin with, the bit edge
 * @param perBlock M, from 2 to the periods in a bit; 20 for GPS L1 C/A
 * @param periodS T, 1 ms for C/A
 * @returns NaN without one whole block, -Infinity when the noise hides the signal
 */
export function narrowWideCn0DbHz(
  prompts: ArrayLike<number>,
  first: number,
  perBlock: number,
  periodS: number,
): number {
  if (!(Number.isInteger(perBlock) && perBlock >= 2))
    throw new RangeError(`narrowWideCn0DbHz: blocks of 2 periods at least, got ${perBlock}`);
  let [narrow, wide] = [0, 0];
  for (let from = first; from + perBlock <= prompts.length / 2; from += perBlock) {
    let [re, im] = [0, 0];
    for (let n = from; n < from + perBlock; n++) {
      re += prompts[2 * n];
      im += prompts[2 * n + 1];
      wide += prompts[2 * n] * prompts[2 * n] + prompts[2 * n + 1] * prompts[2 * n + 1];
    }
    narrow += re * re + im * im;
  }
  if (wide === 0) return NaN;
  const ratio = narrow / wide;
  return ratio > 1 ? decibels((ratio - 1) / (periodS * (perBlock - ratio))) : -Infinity;
}

/**
 * C/N0 in dB-Hz by second and fourth moment: signal power sqrt(2 M2^2 - M4), noise power M2 less that. Pauluzzi &
 * Beaulieu, "A comparison of SNR estimation techniques for the AWGN channel" (2000). Needs neither bit edge nor phase
 * lock, but scatters widely below about 30 dB-Hz at 1 ms.
 * @returns -Infinity when the moments show no signal
 */
export function momentsCn0DbHz(prompts: ArrayLike<number>, periodS: number): number {
  const count = prompts.length / 2;
  if (!(count >= 2)) return NaN;
  let [second, fourth] = [0, 0];
  for (let n = 0; n < count; n++) {
    const power = prompts[2 * n] * prompts[2 * n] + prompts[2 * n + 1] * prompts[2 * n + 1];
    second += power / count;
    fourth += (power * power) / count;
  }
  const square = 2 * second * second - fourth;
  if (!(square > 0)) return -Infinity;
  const signal = Math.sqrt(square);
  return signal < second ? decibels(signal / (second - signal) / periodS) : Infinity;
}
