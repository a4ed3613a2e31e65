import { biasM, levelDb, type Peaks } from "./readPeaks";

/** What the formula of an undisturbed BOC(1,1) says of its side peaks: half as high, 6.02 dB. */
const FORMULA_LEVEL_DB = 6.0206;

// A careful reading must be able to keep the narrowest tolerance that a lead may set, rounding of the answer included.
const LARGEST_LAG_ERROR_CHIPS = 0.008;
const LARGEST_BIAS_ERROR_M = 2.5;
const LARGEST_LEVEL_ERROR_DB = 0.4;
const LEAST_OFF_FORMULA_DB = 1; // of one side peak at least; the default tolerance is 0.7

/** Whether a careful reading of the trace is right, and the formula without a reading is wrong. */
export function isFair(peaks: Peaks, read: Peaks): boolean {
  const readable = (["earlier", "later"] as const).every(
    (side) =>
      Math.abs(biasM(read, side) - biasM(peaks, side)) <= LARGEST_BIAS_ERROR_M &&
      Math.abs(levelDb(read, side) - levelDb(peaks, side)) <= LARGEST_LEVEL_ERROR_DB,
  );
  const offFormula = (["earlier", "later"] as const).some(
    (side) => Math.abs(levelDb(peaks, side) - FORMULA_LEVEL_DB) >= LEAST_OFF_FORMULA_DB,
  );
  return Math.abs(read.main.lagChips - peaks.main.lagChips) <= LARGEST_LAG_ERROR_CHIPS && readable && offFormula;
}
