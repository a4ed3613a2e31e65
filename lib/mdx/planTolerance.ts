import { formatUnit } from "@/lib/checks/formatQuantity";
import type { QuantityDefinition, ToleranceValue } from "@/lib/checks/kind";
import { parseQuantity } from "@/lib/checks/parseQuantity";
import { UNITS, type Unit } from "@/lib/gnss/units";
import { numberValue } from "@/lib/mdx/attributeValue";
import { problemAt, type Problem, type Range, type Repair } from "@/lib/mdx/problem";
import { toleranceText } from "@/lib/mdx/toleranceText";

/** The tolerance a lead wrote, in the unit of the kind; a fault says what could be compared and offers the kind's own. */
export function planTolerance(
  definition: QuantityDefinition,
  written: string,
  range: Range,
): { tolerance: ToleranceValue } | { problem: Problem } {
  const { tolerance: usual, toleranceRange: bounds } = definition;
  const refuse = (message: string, repair?: Repair) => ({ problem: problemAt(range, "tolerance", message, repair) });
  if (!usual || !bounds) {
    const message = `The tolerance of "${definition.id}" is fixed by its kind. Delete the attribute.`;
    return refuse(message, { label: "Delete tolerance", text: "", ...range });
  }
  const text = written.replace(/^(±|\+\/-|\+-)\s*/, "");
  const example = toleranceText(usual);
  const repair = { label: `Write “${example}”`, text: `tolerance="${example}"`, ...range };
  const other = unitOfAnotherKind(text, bounds.unit);
  if (other) return refuse(`Tolerance is in ${other}, but ${whatFits(definition, bounds.unit)}`, repair);
  const read = numberValue("tolerance", bounds, text);
  return "problem" in read ? refuse(read.problem, repair) : { tolerance: { value: read.value, unit: bounds.unit } };
}

function whatFits({ unit }: QuantityDefinition, wanted: Unit): string {
  const relative = unit !== null && UNITS[unit].dimension !== UNITS[wanted].dimension;
  if (relative) return `that of this quantity is a share of it, in ${formatUnit(wanted)}.`;
  const own = formatUnit(wanted) || "a plain number";
  return `this quantity is in ${own}. Nothing handed in could be compared with it.`;
}

/** The unit as typed when it is a known one that cannot be turned into the wanted one. */
function unitOfAnotherKind(text: string, wanted: Unit): string | null {
  if ("value" in parseQuantity(text, wanted)) return null;
  const typed = /[^\d.,\s+\u2212-][^\d]*$/.exec(text)?.[0].trim();
  const known = (Object.keys(UNITS) as Unit[]).some((unit) => "value" in parseQuantity(text, unit));
  return typed && known ? typed : null;
}
