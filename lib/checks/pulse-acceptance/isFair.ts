import type { PulseAcceptanceTruth } from "./drawCase";
import { leaveOut } from "@/lib/gnss/timing/cleanTimeError";
import { MAX_TIME_ERROR_NS } from "@/lib/gnss/timing/clockLimits";
import { summarizeTimeError } from "@/lib/gnss/timing/timeError";
import { findStep, timeErrorOf, withoutMissedTriggers } from "./judgeLog";
import { toleranceNs } from "./toleranceNs";

const CLEAR = 2.5; // tolerances that a wrong method's value lies off at least
export const CLASSES = ["PRTC-A", "PRTC-B"] as const;
export const CLEAR_NS = 3; // of either published limit, so that reading errors do not turn the verdict
const STEP_READINGS = 4; // that a careful look may place the step off; ten are allowed

/** Whether the log can be read rightly, and no mistake lands on the right value. Cheap questions first. */
export function isFair(truth: PulseAcceptanceTruth): boolean {
  const { startCableNs, stopCableNs, shape, figures } = truth;
  const leadsNs = stopCableNs - startCableNs;
  const series = timeErrorOf(truth.intervalS, truth.readingsNs, truth);
  const triggers = shape.triggers.map(({ index }) => index).sort((a, b) => a - b);
  const clean = leaveOut(series, triggers);
  const maxWith = (addedNs: number) =>
    summarizeTimeError({ ...clean, valuesNs: clean.valuesNs.map((value) => value + addedNs) }).maxAbsNs;
  const off = (value: number, right: number) => Math.abs(value - right) >= CLEAR * toleranceNs(2, right);
  const step = findStep(clean);
  return (
    CLASSES.every((clock) => Math.abs(figures.maxTeNs - MAX_TIME_ERROR_NS[clock]) >= CLEAR_NS) &&
    off(figures.meanNs + leadsNs, figures.meanNs) &&
    off(maxWith(leadsNs), figures.maxTeNs) &&
    off(maxWith(2 * leadsNs), figures.maxTeNs) &&
    off(maxWith(-figures.meanNs), figures.maxTeNs) &&
    off(figures.deviationNs, figures.maxTeNs) &&
    off(figures.peakToPeakNs, figures.mtieShortNs) &&
    off(figures.mtieLongNs, figures.mtieShortNs) &&
    (shape.step ? step !== null && Math.abs(step - shape.step.index) <= STEP_READINGS : step === null) &&
    withoutMissedTriggers(series).missed.join() === triggers.join()
  );
}
