import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import type { Answers, MarkedRow } from "../kind";
import type { Finding } from "../markNumber";
import { markTime } from "../markTime";
import type { LostDecibelsTruth } from "./drawCase";

type Truth = LostDecibelsTruth;

/** A slow fall has no sharp foot: a tenth of its length counts where that is more. */
export function markStart(truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const { fault, log } = truth;
  const lengthS = fault?.slow ? (fault.readings[1] - fault.readings[0]) * log.intervalS : 0;
  const toleranceS = Math.max(quantity.tolerance, lengthS / 10);
  return markTime({
    quantity,
    typed: answerOf(answers, "fault.start"),
    computedS: secondsOf(truth, 0),
    toleranceS,
    explain: (offS) => explainTime(offS, toleranceS) ?? explainLate(offS, lengthS),
  });
}

export const markStop = (truth: Truth, quantity: AskedQuantity, answers: Answers): MarkedRow =>
  markTime({
    quantity,
    typed: answerOf(answers, "fault.stop"),
    computedS: secondsOf(truth, 1),
    toleranceS: quantity.tolerance,
    explain: (offS) => explainTime(offS, quantity.tolerance),
  });

function secondsOf({ fault, log }: Truth, end: 0 | 1): number | null {
  if (!fault) return null;
  return (log.startUnixMs / 1000 + fault.readings[end] * log.intervalS) % 86_400;
}

function explainTime(offS: number, toleranceS: number): Finding | null {
  const hours = Math.round(offS / 3600);
  if (hours === 0 || Math.abs(hours) > 12 || !(Math.abs(offS - hours * 3600) <= Math.min(toleranceS, 60))) return null;
  return {
    errorClass: "local time for UTC",
    reason: `This is off by ${Math.abs(hours)} ${Math.abs(hours) === 1 ? "hour" : "whole hours"}. The log is in UTC.`,
  };
}

function explainLate(offS: number, lengthS: number): Finding | null {
  if (!(lengthS > 0 && offS > 0 && offS < lengthS)) return null;
  return {
    errorClass: "start read where the fall is plain",
    reason: "The fall began earlier, where gain control and C/N0 leave the level of before.",
  };
}
