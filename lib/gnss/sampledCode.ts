import type { Chips } from "./shiftRegister";

/**
 * Chip that lasts at sample n, counted from 0 on without end. Whole rates in Hz and products below 2^53 make the division
 * exact, so that no sample on a chip's edge falls to the wrong side.
 */
export function chipAtSample(n: number, chipRateHz: number, rateHz: number): number {
  const chipHz = n * chipRateHz;
  return (chipHz - (chipHz % rateHz)) / rateHz;
}

/**
 * A code as a receiver of infinite bandwidth samples it: sample n takes the chip that lasts at n / rate.
 * @param chipRateHz whole
 * @param rateHz whole
 * @param samples how many; the code repeats
 */
export function sampledCode(chips: Chips, chipRateHz: number, rateHz: number, samples: number): Int8Array {
  if (!(Number.isSafeInteger(chipRateHz) && Number.isSafeInteger(rateHz) && chipRateHz > 0 && rateHz > 0))
    throw new RangeError(`sampledCode: whole rates above 0 Hz, got ${chipRateHz} and ${rateHz}`);
  if (!Number.isInteger(samples) || samples < 0 || samples * chipRateHz > Number.MAX_SAFE_INTEGER)
    throw new RangeError(`sampledCode: a whole number of samples within exact arithmetic, got ${samples}`);
  return Int8Array.from({ length: samples }, (_, n) => chips[chipAtSample(n, chipRateHz, rateHz) % chips.length]);
}
