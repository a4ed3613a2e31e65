import type { Unit } from "@/lib/gnss/units";
import type { AskedQuantity } from "./askedQuantities";
import { formatDifference } from "./formatDifference";
import { formatQuantity } from "./formatQuantity";
import { formatUnderstood } from "./formatUnderstood";
import type { MarkedRow } from "./kind";
import { parseQuantity, type Reading } from "./parseQuantity";

export type Finding = { errorClass: string | null; reason: string };

export type NumberLine = {
  quantity: AskedQuantity;
  subject?: string;
  label?: string;
  typed: string;
  computed: number;
  unit: Unit;
  decimals: number;
  /** In `unit`. */
  tolerance: number;
  toleranceText?: string;
  /** For texts that hold more than a number with a unit of its dimension. */
  read?: (typed: string) => Reading;
  /** Refuses a value that the quantity cannot have. */
  impossible?: (value: number) => Finding | null;
  /** Signed, handed in minus computed; circular quantities go the short way round. */
  difference?: (value: number, computed: number) => number;
  /** Names the error behind an outside value, where it is a known one. */
  explain?: (value: number, difference: number) => Finding | null;
};

/** Marks one number. Within is `off <= tolerance`, so that a value that is not a number is outside. */
export function markNumber(line: NumberLine): MarkedRow {
  const reading = line.read ? line.read(line.typed) : parseQuantity(line.typed, line.unit);
  if ("problem" in reading) return row(line, null, NaN, { errorClass: null, reason: reading.problem });
  const { value } = reading;
  const impossible = line.impossible?.(value);
  if (impossible) return row(line, value, NaN, impossible);
  const difference = line.difference ? line.difference(value, line.computed) : value - line.computed;
  if (Math.abs(difference) <= line.tolerance) return row(line, value, difference, null);
  return row(line, value, difference, line.explain?.(value, difference) ?? plainFinding(line, difference));
}

function row(line: NumberLine, value: number | null, difference: number, finding: Finding | null): MarkedRow {
  const off = difference / line.tolerance;
  return {
    quantity: line.quantity.id,
    subject: line.subject ?? null,
    label: line.label ?? line.quantity.label,
    handedIn: line.typed,
    understood: value === null ? null : formatUnderstood(value, line.unit),
    computed: formatQuantity(line.computed, line.unit, line.decimals),
    difference: Number.isFinite(difference) ? formatDifference(difference, line.unit, line.decimals) : null,
    tolerance: line.toleranceText ?? toleranceText(line.tolerance, line.unit),
    offByTolerances: Number.isFinite(off) ? off : null,
    within: finding === null,
    critical: line.quantity.critical,
    errorClass: finding?.errorClass ?? null,
    reason: finding?.reason ?? null,
  };
}

/** Three figures are enough to compare with. */
export const toleranceText = (tolerance: number, unit: Unit) =>
  `±${formatUnderstood(Number(tolerance.toPrecision(3)), unit)}`;

function plainFinding(line: NumberLine, difference: number): Finding {
  const size = formatQuantity(Math.abs(difference), line.unit, line.decimals);
  const side = difference > 0 ? "above" : "below";
  const allowed = formatUnderstood(Number(line.tolerance.toPrecision(3)), line.unit);
  return { errorClass: null, reason: `Your value is ${size} ${side} the computed one; ${allowed} is allowed.` };
}
