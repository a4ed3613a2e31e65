/** A serial search: one cell after the other, each tried once, until the right one is hit. */
export type SerialSearch = {
  /** Cells, one of which is right; the search begins at any of them alike. */
  cells: number;
  detection: number;
  falseAlarm: number;
  /** Time to try one cell. */
  dwellS: number;
  /** Dwells that a false alarm costs. */
  penaltyDwells: number;
};

/**
 * Mean time in s until the right cell is found: [2 + (2 - Pd)(q - 1)(1 + K Pfa)]/(2 Pd) dwells. Holmes & Chen,
 * "Acquisition time performance of PN spread-spectrum systems" (1977; from memory).
 */
export function meanAcquisitionTimeS({ cells, detection, falseAlarm, dwellS, penaltyDwells }: SerialSearch): number {
  if (!(cells >= 1 && detection > 0 && detection <= 1 && falseAlarm >= 0 && falseAlarm <= 1))
    throw new RangeError(
      `meanAcquisitionTimeS: a cell at least and probabilities, got ${cells} cells, ${detection}, ${falseAlarm}`,
    );
  const wrongCells = (2 - detection) * (cells - 1) * (1 + penaltyDwells * falseAlarm);
  return ((2 + wrongCells) / (2 * detection)) * dwellS;
}
