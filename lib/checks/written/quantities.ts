import type { CheckPlan, QuantityDefinition } from "../kind";
import type { WrittenParameters } from "./parameters";

/** Each line is a quantity without a number: a person says whether it is within. */
export const writtenQuantities = ({ parameters }: CheckPlan<WrittenParameters>): QuantityDefinition[] =>
  parameters.lines.map(({ id, label, critical }) => ({
    id,
    label,
    unit: null,
    tolerance: null,
    toleranceRange: null,
    critical,
    reason: "Judged by an assessor, with a reason.",
  }));
