import { CA_LENGTH_CHIPS } from "./constants";
import { coherentSnr } from "./detection";
import { falsePeakRows, type FalseLockQuestion } from "./falseLock";

/** Mean power that a search sees, cell by cell; noise = 1. */
export type FalsePeakMap = {
  /** One row for each Doppler at which false peaks can stand, lowest first. */
  dopplersHz: Float64Array;
  /** Code phase minus the parent's code phase, 0 to 1022. */
  lagsChips: Float64Array;
  /** Row after row: 1 + C/N0 T (R/1023)^2, the mean of a sum of squares in which a signal stands. */
  power: Float32Array;
};

/** The map of `falsePeaks`: what one strong satellite puts into the search for another one's code, noise averaged out. */
export function falsePeakMap(question: FalseLockQuestion): FalsePeakMap {
  const rows = falsePeakRows(question);
  const snr = coherentSnr(question.parentCn0DbHz, question.coherentMs / 1000);
  const power = new Float32Array(rows.length * CA_LENGTH_CHIPS);
  rows.forEach(({ levels }, row) =>
    levels.forEach((level, lag) => {
      const share = level / CA_LENGTH_CHIPS;
      power[row * CA_LENGTH_CHIPS + lag] = 1 + snr * share * share;
    }),
  );
  return {
    dopplersHz: Float64Array.from(rows, ({ differenceHz }) => question.parentDopplerHz + differenceHz),
    lagsChips: Float64Array.from({ length: CA_LENGTH_CHIPS }, (_, lag) => lag),
    power,
  };
}
