import { chipsToMetres } from "@/lib/gnss/constants";
import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding, type NumberLine } from "../markNumber";
import { parseQuantity } from "../parseQuantity";
import type { SidePeakTruth } from "./drawCase";
import type { Side } from "./readPeaks";
import { outOfTrace } from "./reading-rows";

/** Tracked lag less the main peak's, in m, from the candidate's own lag where there is one. */
export const markLockBias = (truth: SidePeakTruth, quantity: AskedQuantity, answers: Answers): MarkedRow =>
  markNumber({ ...biasLine(truth, truth.trackedLagChips, quantity, answers), typed: answerOf(answers, "lock.bias") });

/** The same of a side peak. */
export const markSideBias = (truth: SidePeakTruth, side: Side, quantity: AskedQuantity, answers: Answers): MarkedRow =>
  markNumber({
    ...biasLine(truth, truth.peaks[side].lagChips, quantity, answers),
    subject: side,
    label: `${quantity.label}, ${side === "earlier" ? "before the main peak" : "behind it"}`,
    typed: answerOf(answers, `${side}.bias`),
  });

function biasLine(
  truth: SidePeakTruth,
  lagChips: number,
  quantity: AskedQuantity,
  answers: Answers,
): Omit<NumberLine, "typed"> {
  const base = baseLag(truth, answers);
  const computed = chipsToMetres(lagChips - base.chips);
  const worked = `${formatQuantity(lagChips, "chip", 3)} less ${base.words} is ${formatQuantity(lagChips - base.chips, "chip", 3)}, ${formatQuantity(computed, "m", 1)}.`;
  return {
    quantity,
    computed,
    unit: "m",
    decimals: 1,
    tolerance: quantity.tolerance,
    explain: (value) => ({ errorClass: biasError(value, computed, quantity.tolerance), reason: worked }),
  };
}

/** Follow-through: an own lag on the trace is the base, however wrong; else the true one. */
function baseLag(truth: SidePeakTruth, answers: Answers): { chips: number; words: string } {
  const own = parseQuantity(answerOf(answers, "lock.lag"), "chip");
  if ("value" in own && !outOfTrace(truth, own.value))
    return { chips: own.value, words: `your own main peak at ${formatUnderstood(own.value, "chip")}` };
  const { lagChips } = truth.peaks.main;
  return { chips: lagChips, words: `the main peak's ${formatQuantity(lagChips, "chip", 3)}` };
}

function biasError(value: number, computed: number, toleranceM: number): Finding["errorClass"] {
  const near = (wrong: number) => Math.abs(value - wrong) <= toleranceM;
  if (Math.abs(computed) > 2 * toleranceM && near(-computed)) return "sign";
  if (near(chipsToMetres(1)) || near(-chipsToMetres(1))) return "whole chip for half a chip";
  if (near(0)) return "bias left out";
  return null;
}
