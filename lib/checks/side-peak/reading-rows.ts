import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { parseQuantity, type Reading } from "../parseQuantity";
import { STEP_CHIPS, type SidePeakTruth } from "./drawCase";
import { levelDb, type Side } from "./readPeaks";

/** The lag of the highest peak, as it would stand without noise. */
export const markLag = (truth: SidePeakTruth, quantity: AskedQuantity, answers: Answers): MarkedRow =>
  markNumber({
    quantity,
    typed: answerOf(answers, "lock.lag"),
    computed: truth.peaks.main.lagChips,
    unit: "chip",
    decimals: 3,
    tolerance: quantity.tolerance,
    impossible: (value) => outOfTrace(truth, value),
    explain: (value) => sideTaken(truth, value, quantity.tolerance),
  });

export function outOfTrace({ fromChips, trace }: SidePeakTruth, lagChips: number): Finding | null {
  const toChips = fromChips + (trace.length - 1) * STEP_CHIPS;
  if (lagChips >= fromChips && lagChips <= toChips) return null;
  const ends = `${formatQuantity(fromChips, "1", 2)} to ${formatQuantity(toChips, "chip", 2)}`;
  return { errorClass: null, reason: `The trace runs from ${ends}.` };
}

function sideTaken({ peaks }: SidePeakTruth, value: number, tolerance: number): Finding | null {
  const side = (["earlier", "later"] as const).find((one) => Math.abs(value - peaks[one].lagChips) <= tolerance);
  if (!side) return null;
  return {
    errorClass: "side peak taken for the main one",
    reason: `A side peak stands there, ${formatQuantity(levelDb(peaks, side), "dB", 1)} under the highest one.`,
  };
}

/** How far a side peak is down, positive; a minus before it says the same. */
export function markSideLevel(
  { peaks }: SidePeakTruth,
  side: Side,
  quantity: AskedQuantity,
  answers: Answers,
): MarkedRow {
  const computed = levelDb(peaks, side);
  const other = levelDb(peaks, side === "earlier" ? "later" : "earlier");
  return markNumber({
    quantity,
    subject: side,
    label: `${quantity.label}, ${side === "earlier" ? "before it" : "behind it"}`,
    typed: answerOf(answers, `${side}.level`),
    computed,
    unit: "dB",
    decimals: 1,
    tolerance: quantity.tolerance,
    read: readUnder,
    explain: (value) => levelError(value, computed, other, quantity.tolerance),
  });
}

function readUnder(typed: string): Reading {
  const reading = parseQuantity(typed, "dB");
  return "value" in reading ? { value: Math.abs(reading.value) } : reading;
}

function levelError(value: number, computed: number, other: number, tolerance: number): Finding | null {
  const near = (wrong: number) => Math.abs(value - wrong) <= tolerance / 2;
  if (near(computed / 2))
    return {
      errorClass: "power formula on an amplitude",
      reason: "The trace is a magnitude, so its ratio in dB is 20 log, not 10 log.",
    };
  if (near(6.0206))
    return {
      errorClass: "formula for reading",
      reason: `6 dB is the undisturbed BOC(1,1); in this trace the peak is ${formatQuantity(computed, "dB", 1)} down.`,
    };
  if (near(other))
    return { errorClass: "sides exchanged", reason: "This is the level of the side peak on the other side." };
  return null;
}
