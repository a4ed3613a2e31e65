import { readTimeErrorLog } from "@/lib/formats/readTimeErrorLog";
import type { TimeErrorSeries } from "@/lib/gnss/timing/timeError";
import type { Answers, BuiltCase } from "../kind";
import type { PulseAcceptanceTruth } from "./drawCase";
import { findStep, judgeLog, timeErrorOf, withoutMissedTriggers, type Cables, type LogFigures } from "./judgeLog";
import { LOG_FILE } from "./publicCase";

type Built = Pick<BuiltCase<PulseAcceptanceTruth>, "publicCase" | "files">;

/** One step of the work each, so that a wrong method is the right one with one step of its own. */
export type Steps = {
  cables(given: Cables): Cables;
  clean(series: TimeErrorSeries): TimeErrorSeries;
  figures(figures: LogFigures, series: TimeErrorSeries): LogFigures;
  stepMin(minutes: number): number;
};

const RIGHT: Steps = {
  cables: (given) => given,
  clean: (series) => withoutMissedTriggers(series).series,
  figures: (figures) => figures,
  stepMin: (minutes) => minutes,
};

/** The right method, from the log file and what is given; `other` replaces single steps of it. */
export function solve({ publicCase: { data }, files }: Built, other: Partial<Steps> = {}): Answers {
  const steps = { ...RIGHT, ...other };
  const { bytes } = files.find(({ name }) => name === LOG_FILE)!;
  const { series: read } = readTimeErrorLog(new TextDecoder().decode(bytes));
  const series = steps.clean(timeErrorOf(read.intervalS, read.valuesNs, steps.cables(data as unknown as Cables)));
  const intervals = { shortS: data.mtieShortS as number, longS: data.mtieLongS as number };
  const { meanNs, maxTeNs, mtieShortNs, mtieLongNs } = steps.figures(judgeLog(series, intervals), series);
  const step = findStep(series);
  return {
    "log.mean": meanNs.toFixed(1),
    "log.maxTe": maxTeNs.toFixed(1),
    "log.mtieShort": mtieShortNs.toFixed(1),
    "log.mtieLong": mtieLongNs.toFixed(1),
    "step.seen": step === null ? "no" : "yes",
    "step.time": step === null ? "" : steps.stepMin((step * series.intervalS) / 60).toFixed(1),
    "verdict.kept": maxTeNs <= (data.limitNs as number) ? "accept" : "refuse",
  };
}
