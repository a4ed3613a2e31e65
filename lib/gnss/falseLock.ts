import { decibels } from "@/lib/numeric/elementary";
import { caCode } from "./caCode";
import { CA_LENGTH_CHIPS } from "./constants";
import { dopplerCorrelation } from "./crossCorrelation";
import { coherentSnr, detectionProbability, falseAlarmPerCell, thresholdSigma2 } from "./detection";

const WITHIN_DB = 3; // of the highest: what lies below is not what a search locks on
const FALSE_ALARM_PER_SEARCH = 1e-3;

/** A strong satellite, and the code of another one that is searched for. */
export type FalseLockQuestion = {
  parentPrn: number;
  victimPrn: number;
  parentDopplerHz: number;
  parentCn0DbHz: number;
  /** Whole milliseconds, 1 to 20. */
  coherentMs: number;
  sums: number;
  dopplerHalfWidthHz: number;
};

/** One place where the victim's replica meets the parent's signal. */
export type FalsePeak = {
  dopplerHz: number;
  /** Code phase of the false peak minus the parent's code phase, 0 to 1022. */
  lagChips: number;
  /** Below 0: against the parent's own peak. */
  levelDb: number;
  apparentCn0DbHz: number;
  /** Chance that the search passes its threshold here: 1e-3 false alarms per search, bins of 1/(2T), half-chip steps. */
  detection: number;
};

/**
 * False peaks that the signal of one satellite raises in the search for another, highest first, as far as 3 dB below the
 * highest. Both codes repeat each millisecond, so a longer coherent sum keeps the peaks whose Doppler differs from the
 * parent's by whole kHz and no others; a 1 ms sum also shows those at half kHz. Computed from the two codes.
 */
export function falsePeaks(question: FalseLockQuestion): FalsePeak[] {
  const { parentDopplerHz } = question;
  const cells: { differenceHz: number; lagChips: number; level: number }[] = [];
  let top = 0;
  for (const { differenceHz, levels } of falsePeakRows(question)) {
    levels.forEach((level, lagChips) => {
      top = Math.max(top, level);
      cells.push({ differenceHz, lagChips, level });
    });
  }
  const toDb = (level: number) => 2 * decibels(level / CA_LENGTH_CHIPS);
  const detection = detectionOf(question);
  return cells
    .filter(({ level }) => toDb(level) >= toDb(top) - WITHIN_DB)
    .sort((a, b) => b.level - a.level || a.differenceHz - b.differenceHz || a.lagChips - b.lagChips)
    .map(({ differenceHz, lagChips, level }) => {
      const apparentCn0DbHz = question.parentCn0DbHz + toDb(level);
      const dopplerHz = parentDopplerHz + differenceHz;
      return { dopplerHz, lagChips, levelDb: toDb(level), apparentCn0DbHz, detection: detection(apparentCn0DbHz) };
    });
}

/** Correlation of the two codes at one Doppler: chips by whole lag, `dopplerCorrelation`. */
export type FalsePeakRow = { differenceHz: number; levels: Float64Array };

/** The rows of a search's window in which false peaks can stand, from the lowest Doppler up; none in a narrow window. */
export function falsePeakRows(question: FalseLockQuestion): FalsePeakRow[] {
  const { parentPrn, victimPrn, parentDopplerHz, coherentMs, dopplerHalfWidthHz } = question;
  if (!(Number.isInteger(coherentMs) && coherentMs >= 1 && coherentMs <= 20))
    throw new RangeError(`falsePeaks: 1 to 20 whole milliseconds, got ${coherentMs}`);
  const stepHz = coherentMs === 1 ? 500 : 1000;
  const lowest = Math.ceil((-dopplerHalfWidthHz - parentDopplerHz) / stepHz);
  const highest = Math.floor((dopplerHalfWidthHz - parentDopplerHz) / stepHz);
  const rows: FalsePeakRow[] = [];
  for (let n = lowest; n <= highest; n++) {
    const levels = dopplerCorrelation(caCode(parentPrn), caCode(victimPrn), -n * stepHz, coherentMs / 1000);
    rows.push({ differenceHz: n * stepHz, levels });
  }
  return rows;
}

function detectionOf({ coherentMs, sums, dopplerHalfWidthHz }: FalseLockQuestion): (cn0DbHz: number) => number {
  const coherentS = coherentMs / 1000;
  const cells = (2 * Math.ceil(dopplerHalfWidthHz * 2 * coherentS) + 1) * 2 * CA_LENGTH_CHIPS;
  const threshold = thresholdSigma2(falseAlarmPerCell(FALSE_ALARM_PER_SEARCH, cells), sums);
  return (cn0DbHz) => detectionProbability(threshold, sums, coherentSnr(cn0DbHz, coherentS));
}
