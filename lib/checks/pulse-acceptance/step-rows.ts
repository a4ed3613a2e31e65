import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import type { Answers, MarkedRow } from "../kind";
import { markChoice } from "../markChoice";
import { markNumber } from "../markNumber";
import type { PulseAcceptanceTruth } from "./drawCase";

/** Time of the first reading after the step; null where there is none. */
export const stepMinutes = ({ shape, intervalS }: PulseAcceptanceTruth): number | null =>
  shape.step ? (shape.step.index * intervalS) / 60 : null;

/** The word, and the time where there is a step. */
export function markStep(truth: PulseAcceptanceTruth, quantity: AskedQuantity, answers: Answers): MarkedRow[] {
  const computed = stepMinutes(truth);
  const word = markChoice({
    quantity,
    label: "Is there a step?",
    typed: answerOf(answers, "step.seen"),
    right: [computed === null ? "no" : "yes"],
    explain: () =>
      computed === null
        ? { errorClass: "wave taken for a step", reason: "The time error changes slowly all day; no change lasts." }
        : { errorClass: "step missed", reason: `It changes for good at ${formatQuantity(computed, "min", 1)}.` },
  });
  if (computed === null) return [word];
  const time = markNumber({
    quantity,
    label: "Time of the step",
    typed: answerOf(answers, "step.time"),
    computed,
    unit: "min",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) => explainTime(truth, value, quantity.tolerance),
  });
  return [word, time];
}

function explainTime({ shape, intervalS }: PulseAcceptanceTruth, value: number, tolerance: number) {
  const near = (minutes: number) => Math.abs(value - minutes) <= tolerance;
  if (shape.triggers.some(({ index }) => near((index * intervalS) / 60))) {
    return { errorClass: "missed trigger taken for the step", reason: "One reading stands out here; nothing lasts." };
  }
  const inReadings = Math.abs(value - shape.step!.index) <= (tolerance * 60) / intervalS;
  return inReadings
    ? {
        errorClass: "readings for minutes",
        reason: "This is the number of the reading; readings are half a minute apart.",
      }
    : null;
}
