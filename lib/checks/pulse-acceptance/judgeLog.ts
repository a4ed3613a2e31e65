import { findOutliers, leaveOut } from "@/lib/gnss/timing/cleanTimeError";
import { largestStep } from "@/lib/gnss/timing/largestStep";
import { mtieNs } from "@/lib/gnss/timing/mtie";
import { summarizeTimeError, type TimeErrorSeries } from "@/lib/gnss/timing/timeError";

/** What an acceptance asks of a log. */
export type LogFigures = {
  meanNs: number;
  maxTeNs: number;
  deviationNs: number;
  peakToPeakNs: number;
  mtieShortNs: number;
  mtieLongNs: number;
};

export type MtieIntervals = { shortS: number; longS: number };

export type Cables = { startCableNs: number; stopCableNs: number };

/** Time error from a counter's readings: what its leads add is taken off. */
export function timeErrorOf(intervalS: number, readingsNs: ArrayLike<number>, cables: Cables): TimeErrorSeries {
  const leadsNs = cables.stopCableNs - cables.startCableNs;
  const valuesNs = Float64Array.from(readingsNs);
  for (let n = 0; n < valuesNs.length; n++) valuesNs[n] -= leadsNs;
  return { intervalS, valuesNs };
}

/** Definitions of ITU-T G.810 (MTIE) and G.8260 (max|TE|, with the mean in it). */
export function judgeLog(series: TimeErrorSeries, intervals: MtieIntervals): LogFigures {
  const { meanNs, maxAbsNs, standardDeviationNs, peakToPeakNs } = summarizeTimeError(series);
  return {
    meanNs,
    maxTeNs: maxAbsNs,
    deviationNs: standardDeviationNs,
    peakToPeakNs,
    mtieShortNs: mtieOver(series, intervals.shortS),
    mtieLongNs: mtieOver(series, intervals.longS),
  };
}

/** MTIE over an interval that is a whole number of the log's own. */
export const mtieOver = (series: TimeErrorSeries, tauS: number): number => mtieNs(series, tauS / series.intervalS);

/** Readings that no neighbour supports, and the series without them. */
export function withoutMissedTriggers(series: TimeErrorSeries): { missed: number[]; series: TimeErrorSeries } {
  const missed = findOutliers(series);
  return { missed, series: leaveOut(series, missed) };
}

const WINDOW = 60; // half an hour on each side: the sawtooth has gone, and the daily wave has hardly moved
const LEAST_STEP_NS = 6.5; // what is drawn has 8 ns or more, or none

/** Index of the first reading after the lasting step; null where there is none. */
export function findStep(series: TimeErrorSeries): number | null {
  const step = largestStep(series, WINDOW);
  return step && Math.abs(step.sizeNs) >= LEAST_STEP_NS ? step.index : null;
}
