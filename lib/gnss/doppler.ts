import { CA_CHIP_RATE_HZ, L1_HZ, SPEED_OF_LIGHT_M_S } from "./constants";

/** Doppler in Hz of a carrier when the range grows at `rangeRateMS`; negative then. Textbook. */
export const dopplerOfRangeRateHz = (rangeRateMS: number, carrierHz: number): number =>
  (-rangeRateMS / SPEED_OF_LIGHT_M_S) * carrierHz;

/** Change of the C/A chip rate in chips per second that goes with a carrier's Doppler; at L1 a 1540th of it. */
export const codeDopplerChipsPerS = (dopplerHz: number, carrierHz = L1_HZ): number =>
  (dopplerHz * CA_CHIP_RATE_HZ) / carrierHz;

/** Time in s in which an uncompensated code Doppler moves the code by half a chip; Infinity at 0 Hz. */
export const halfChipSlipS = (dopplerHz: number): number => 0.5 / Math.abs(codeDopplerChipsPerS(dopplerHz));

/** Shift in Hz of everything at L1 when the receiver's reference is wrong by `ppm`: 1575.42 Hz each. Definition. */
export const clockErrorHz = (ppm: number): number => ppm * 1e-6 * L1_HZ;

/** Length of one C/A code period in samples. @throws RangeError unless whole and at least two per chip */
export function samplesPerCodePeriod(rateHz: number): number {
  const samples = rateHz / 1000;
  if (!Number.isInteger(samples) || rateHz < 2 * CA_CHIP_RATE_HZ)
    throw new RangeError(`samplesPerCodePeriod: a whole number of kHz from 2046, got ${rateHz} Hz`);
  return samples;
}
