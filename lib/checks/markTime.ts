import type { AskedQuantity } from "./askedQuantities";
import { circularDifference } from "./circularDifference";
import { formatUnderstood } from "./formatUnderstood";
import type { MarkedRow } from "./kind";
import { markNumber, type Finding } from "./markNumber";
import { markWord } from "./markWord";
import { clockText, parseTimeOfDay } from "./parseTimeOfDay";

const DAY_S = 86_400;

export type TimeLine = {
  quantity: AskedQuantity;
  label?: string;
  typed: string;
  /** Seconds of the day, UTC; null when the right answer is that there is none. */
  computedS: number | null;
  toleranceS: number;
  /** Names the error behind a time that is outside. */
  explain?: (offS: number) => Finding | null;
};

/** Marks a time of day, the short way round midnight. */
export function markTime(line: TimeLine): MarkedRow {
  const reading = parseTimeOfDay(line.typed);
  const { quantity, label, typed, computedS } = line;
  if (computedS === null || "none" in reading) {
    const finding = findingOfNone(line, reading);
    const understood = "none" in reading ? "none" : "problem" in reading ? undefined : clockText(reading.secondsOfDay);
    const computed = computedS === null ? "none" : clockText(computedS);
    return markWord({ quantity, label, handedIn: typed, understood, computed, finding });
  }
  const row = markNumber({
    quantity,
    label,
    typed,
    computed: computedS,
    unit: "s",
    decimals: 0,
    tolerance: line.toleranceS,
    read: () => ("problem" in reading ? reading : { value: reading.secondsOfDay }),
    difference: (value, computed) => circularDifference(value, computed, DAY_S),
    explain: (value, off) => line.explain?.(off) ?? plainFinding(line, off),
  });
  const understood = "secondsOfDay" in reading ? clockText(reading.secondsOfDay) : null;
  return { ...row, understood, computed: clockText(computedS) };
}

function findingOfNone({ computedS }: TimeLine, reading: ReturnType<typeof parseTimeOfDay>): Finding | null {
  if ("problem" in reading) return { errorClass: null, reason: reading.problem };
  if (computedS === null)
    return "none" in reading ? null : { errorClass: null, reason: "There is no such time in this log." };
  return { errorClass: null, reason: `There is such a time: ${clockText(computedS)}.` };
}

function plainFinding({ toleranceS }: TimeLine, offS: number): Finding {
  const side = offS > 0 ? "after" : "before";
  const allowed = formatUnderstood(Math.round(toleranceS), "s");
  return {
    errorClass: null,
    reason: `Your time is ${formatUnderstood(Math.abs(offS), "s")} ${side} the computed one; ${allowed} is allowed.`,
  };
}
