import { formatQuantity } from "../formatQuantity";
import type { Marking } from "../kind";
import { decimalsOfGiven } from "./givenValues";
import type { FormulaTruth } from "./drawCase";
import type { FormulaParameters } from "./parameters";
import { capital } from "./quantities";
import { decimalsFor, toleranceAt } from "./tolerances";

/** Givens, the right values with their formulas, and where the wrong ways lead. */
export function workingsOf({ givens, right, wrong }: FormulaTruth, parameters: FormulaParameters): Marking["workings"] {
  const quantities = new Map(parameters.quantities.map((one) => [one.id, one]));
  const valueText = (value: number, id: string) => {
    const quantity = quantities.get(id)!;
    return formatQuantity(value, quantity.unit, decimalsFor(toleranceAt(quantity, right[id])));
  };
  return [
    ...parameters.givens.map((given) => ({
      label: `${capital(given.label)}, ${given.id}`,
      value: formatQuantity(givens[given.id], given.unit, decimalsOfGiven(given)),
    })),
    ...parameters.quantities.map(({ id, label, answer }) => ({
      label: `${capital(label)}, ${id}`,
      value: `${answer.trim()} = ${valueText(right[id], id)}`,
    })),
    ...parameters.wrongs.map(({ id, label, of, answer }) => ({
      label: `Wrong way: ${label}`,
      value: `${answer.trim()} = ${valueText(wrong[id], of)}`,
    })),
  ];
}
