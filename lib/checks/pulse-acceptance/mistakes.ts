import { leaveOut } from "@/lib/gnss/timing/cleanTimeError";
import { summarizeTimeError, type TimeErrorSeries } from "@/lib/gnss/timing/timeError";
import { formatQuantity } from "../formatQuantity";
import type { Finding } from "../markNumber";
import type { PulseAcceptanceTruth } from "./drawCase";
import { mtieOver, timeErrorOf, type Cables } from "./judgeLog";

/** What a known mistake makes of a figure, worked out only when it is asked. */
export type Mistake = Finding & { ns: () => number };

const mistake = (errorClass: string, reason: string, ns: () => number): Mistake => ({ errorClass, reason, ns });

const missedOf = ({ shape }: PulseAcceptanceTruth) => shape.triggers.map(({ index }) => index);

/** The log's time error with other leads taken off, and some of its readings left out. */
const seriesWith = ({ intervalS, readingsNs }: PulseAcceptanceTruth, cables: Cables, out: readonly number[]) =>
  leaveOut(timeErrorOf(intervalS, readingsNs, cables), out);

/** max|TE| as it would be without the constant part. */
export function maxWithoutMeanNs(series: TimeErrorSeries): number {
  const { meanNs } = summarizeTimeError(series);
  return summarizeTimeError({ ...series, valuesNs: series.valuesNs.map((value) => value - meanNs) }).maxAbsNs;
}

/** Of mean or max|TE|: counter's leads and missed triggers. */
function leadMistakes(truth: PulseAcceptanceTruth, of: (series: TimeErrorSeries) => number): Mistake[] {
  const { startCableNs, stopCableNs } = truth;
  const adds = `The leads add ${formatQuantity(stopCableNs - startCableNs, "ns", 1)} to each reading`;
  const turned = { startCableNs: stopCableNs, stopCableNs: startCableNs };
  const missed = missedOf(truth);
  return [
    mistake("leads not taken off", `${adds}.`, () =>
      of(seriesWith(truth, { startCableNs: 0, stopCableNs: 0 }, missed)),
    ),
    mistake("leads taken off the wrong way", `${adds}; take that off.`, () => of(seriesWith(truth, turned, missed))),
    ...leftIn(truth, of),
  ];
}

const leftIn = (truth: PulseAcceptanceTruth, of: (series: TimeErrorSeries) => number): Mistake[] =>
  missedOf(truth).length === 0
    ? []
    : [
        mistake("missed triggers left in", "A reading that no other supports is no time error.", () =>
          of(seriesWith(truth, truth, [])),
        ),
      ];

export const meanMistakes = (truth: PulseAcceptanceTruth): Mistake[] => [
  ...leadMistakes(truth, (series) => summarizeTimeError(series).meanNs),
  mistake(
    "sign",
    "A pulse that comes later than the reference has a positive time error.",
    () => -truth.figures.meanNs,
  ),
];

export const maxMistakes = (truth: PulseAcceptanceTruth): Mistake[] => [
  mistake("mean removed", `The mean of ${formatQuantity(truth.figures.meanNs, "ns", 1)} stays in max|TE|.`, () =>
    maxWithoutMeanNs(seriesWith(truth, truth, missedOf(truth))),
  ),
  mistake(
    "standard deviation for maximum",
    "This is the standard deviation; the largest magnitude was asked.",
    () => truth.figures.deviationNs,
  ),
  mistake(
    "peak to peak for maximum",
    "This is the peak to peak of the day; max|TE| is counted from 0.",
    () => truth.figures.peakToPeakNs,
  ),
  ...leadMistakes(truth, (series) => summarizeTimeError(series).maxAbsNs),
];

export function mtieMistakes(truth: PulseAcceptanceTruth, length: "short" | "long"): Mistake[] {
  const { figures, intervals } = truth;
  const tauS = length === "short" ? intervals.shortS : intervals.longS;
  return [
    mistake(
      "whole day for the interval",
      "This is the peak to peak of the whole day, not of the worst window.",
      () => figures.peakToPeakNs,
    ),
    mistake("the other interval", "This is the MTIE over the other interval.", () =>
      length === "short" ? figures.mtieLongNs : figures.mtieShortNs,
    ),
    ...leftIn(truth, (series) => mtieOver(series, tauS)),
  ];
}
