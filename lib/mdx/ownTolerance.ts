import { formatUnit } from "@/lib/checks/formatQuantity";
import { maybeShare, toleranceUnitOf } from "@/lib/checks/formula/tolerances";
import type { ToleranceValue } from "@/lib/checks/kind";
import type { Unit } from "@/lib/gnss/units";
import { numberValue } from "@/lib/mdx/attributeValue";

/** The tolerance of a lead's own quantity: in its unit, in dB for any level, or as a share of the right value in %. */
export function ownTolerance(written: string, unit: Unit): { tolerance: ToleranceValue } | { problem: string } {
  const text = written.replace(/^(±|\+\/-|\+-)\s*/, "");
  const share = /%|percent|per cent/i.test(text) && maybeShare(unit);
  const bounds = share ? SHARE : { unit: toleranceUnitOf(unit), from: SMALLEST, to: LARGEST };
  const read = numberValue("tolerance", bounds, text);
  if ("value" in read) return { tolerance: { value: read.value, unit: bounds.unit } };
  const either = maybeShare(unit) ? " or in % of the right value" : "";
  const own = formatUnit(bounds.unit) || "a plain number";
  return { problem: share ? read.problem : `${read.problem} It is stated in ${own}${either}.` };
}

const SHARE = { unit: "%", from: 0.001, to: 50 } as const;
const SMALLEST = 1e-9;
const LARGEST = 1e12;
