import type { AskedQuantities } from "./askedQuantities";
import type { CheckKind, CheckPlan, MarkedRow, Marking } from "./kind";

/**
 * Puts the rows together: a quantity is within when it has a row and every row that counts is within; the check is met
 * when no critical quantity is outside and at least `needs` are within.
 * @param uncounted rows that are shown and change nothing, such as a satellite found beyond what was asked
 */
export function finishMarking(
  kind: Pick<CheckKind, "id" | "version">,
  plan: CheckPlan,
  asked: AskedQuantities,
  rows: readonly MarkedRow[],
  workings: Marking["workings"],
  uncounted: ReadonlySet<MarkedRow> = new Set(),
): Marking {
  const counted = rows.filter((row) => !uncounted.has(row));
  const quantities = [...asked.values()].map(({ id, label, critical }) => {
    const own = counted.filter((row) => row.quantity === id);
    return { of: id, label, critical, within: own.length > 0 && own.every((row) => row.within) };
  });
  const needs = plan.needs === null ? quantities.length : Math.min(plan.needs, quantities.length);
  const withinCount = quantities.filter((quantity) => quantity.within).length;
  const met = withinCount >= needs && quantities.every((quantity) => quantity.within || !quantity.critical);
  return {
    marking: `${kind.id}@${kind.version}`,
    rows: rows.filter((row) => asked.has(row.quantity)),
    quantities,
    needs,
    withinCount,
    met,
    workings,
  };
}
