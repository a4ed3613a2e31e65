import { findOutliers, leaveOut } from "./cleanTimeError";
import { MAX_TIME_ERROR_NS, mtieLimitNs, tdevLimitNs } from "./clockLimits";
import { timeDeviationNs, usualIntervals } from "./deviations";
import { largestStep, type TimeStep } from "./largestStep";
import { mtieNs } from "./mtie";
import { summarizeTimeError, type TimeErrorSeries, type TimeErrorSummary } from "./timeError";

export type PulseClock = "PRTC-A" | "PRTC-B";

/** A curve against the observation interval with the limit of a class beside it. */
export type MaskedPoint = { tauS: number; ns: number; limitNs: number };

export type PulseReport = {
  summary: TimeErrorSummary;
  maxLimitNs: number;
  mtie: MaskedPoint[];
  tdev: MaskedPoint[];
  /** Readings that no neighbour supports, whether or not they were left out. */
  outliers: number[];
  step: TimeStep | null;
  /** max|TE| is not above its limit. */
  withinMax: boolean;
  /** MTIE and TDEV are nowhere above theirs. */
  withinMtie: boolean;
  withinTdev: boolean;
};

const STEP_WINDOW = 60;
const SHORTEST_MASK_S = 0.1;

/**
 * Everything that an acceptance of a one-pulse-per-second output asks of its log, against ITU-T G.8272: max|TE| with the mean
 * in it, MTIE and TDEV over 1, 2, 5, 10 ... intervals.
 * @param series cables already taken off
 */
export function pulseReport(
  series: TimeErrorSeries,
  clock: PulseClock,
  leaveOutliersOut: boolean,
): { report: PulseReport; series: TimeErrorSeries } {
  const outliers = series.valuesNs.length > 4 * 10 ? findOutliers(series) : [];
  const kept = leaveOutliersOut ? leaveOut(series, outliers) : series;
  const summary = summarizeTimeError(kept);
  const { intervalS, valuesNs } = kept;
  const maxLimitNs = MAX_TIME_ERROR_NS[clock];
  const mtie = masked(
    usualIntervals(valuesNs.length - 1),
    intervalS,
    (n) => mtieNs(kept, n),
    (tau) => mtieLimitNs(clock, tau),
  );
  const third = Math.floor(valuesNs.length / 3);
  const tdev = masked(
    usualIntervals(third),
    intervalS,
    (n) => timeDeviationNs(kept, n),
    (tau) => tdevLimitNs(clock, tau),
  );
  const clean = leaveOutliersOut ? kept : leaveOut(series, outliers);
  const window = Math.min(STEP_WINDOW, Math.floor(valuesNs.length / 2));
  return {
    series: kept,
    report: {
      summary,
      maxLimitNs,
      mtie,
      tdev,
      outliers,
      step: window >= 1 ? largestStep(clean, window) : null,
      withinMax: summary.maxAbsNs <= maxLimitNs,
      withinMtie: mtie.every(({ ns, limitNs }) => ns <= limitNs),
      withinTdev: tdev.every(({ ns, limitNs }) => ns <= limitNs),
    },
  };
}

/** Intervals for which there is no mask are left out, and those for which no difference is complete. */
function masked(
  intervals: readonly number[],
  intervalS: number,
  of: (intervals: number) => number,
  limit: (tauS: number) => number,
): MaskedPoint[] {
  return intervals
    .filter((n) => n * intervalS > SHORTEST_MASK_S)
    .map((n) => ({ tauS: n * intervalS, ns: of(n), limitNs: limit(n * intervalS) }))
    .filter(({ ns }) => !Number.isNaN(ns));
}
