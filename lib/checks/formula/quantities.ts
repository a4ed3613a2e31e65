import type { CheckPlan, QuantityDefinition } from "../kind";
import type { FormulaParameters } from "./parameters";
import { readFormulas } from "./readFormula";

/** The lead's quantities as a catalogue kind has its own; the tolerance is what the module says and nothing else. */
export function formulaQuantities({ parameters }: CheckPlan<FormulaParameters>): QuantityDefinition[] {
  const { answers } = readFormulas(parameters);
  return parameters.quantities.map(({ id, label, unit, tolerance, critical }) => {
    const earlier = parameters.quantities.filter((one) => answers.get(id)?.names.has(one.id));
    return {
      id,
      label: capital(label),
      unit,
      tolerance,
      toleranceRange: { from: tolerance.value, to: tolerance.value, unit: tolerance.unit },
      critical,
      reason:
        earlier.length > 0
          ? `Judged from your own ${earlier.map((one) => one.label).join(" and ")}.`
          : "Set by the module.",
    };
  });
}

export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
