import type { AskedQuantities, AskedQuantity } from "./askedQuantities";
import type { TolerancePublic } from "./kind";
import { toleranceText } from "./markNumber";

/** Tolerances as they are published before the work starts; `worded` gives the text where a bare figure would mislead. */
export const publicTolerances = (
  asked: AskedQuantities,
  worded: Readonly<Record<string, (quantity: AskedQuantity) => string>> = {},
): TolerancePublic[] =>
  [...asked.values()].map((quantity) => ({
    quantity: quantity.id,
    label: quantity.label,
    tolerance: Object.hasOwn(worded, quantity.id) ? worded[quantity.id](quantity) : plainTolerance(quantity),
    critical: quantity.critical,
    reason: quantity.reason,
  }));

const plainTolerance = ({ unit, tolerance }: AskedQuantity) =>
  unit === null || Number.isNaN(tolerance) ? "same" : toleranceText(tolerance, unit);
