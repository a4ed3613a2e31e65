import { askedQuantities } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, FieldSpec, PublicCase, TolerancePublic } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { FormulaTruth } from "./drawCase";
import { decimalsOfGiven } from "./givenValues";
import type { FormulaParameters } from "./parameters";
import { capital, formulaQuantities } from "./quantities";

export const SECTION = "quantities";

/** Field by field: the givens with all their figures, and what is asked; no formula and no wrong method. */
export function publicCase({ givens }: FormulaTruth, plan: CheckPlan<FormulaParameters>): PublicCase {
  const asked = askedQuantities(formulaQuantities(plan), plan);
  const fields: FieldSpec[] = [...asked.values()].map(({ id, label, unit }) => ({
    id,
    label,
    input: "number",
    unit: unit ?? "1",
    signed: true,
    quantity: id,
  }));
  return {
    kind: "formula",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: plan.parameters.givens.map((given) => ({
      label: capital(given.label),
      value: formatQuantity(givens[given.id], given.unit, decimalsOfGiven(given)),
    })),
    cautions: ["life"],
    sections: [{ id: SECTION, title: "Quantities", fields }],
    tolerances: tolerancesOf(plan, asked),
    data: { givens: plan.parameters.givens.map(({ id, label, unit }) => ({ id, label, unit, value: givens[id] })) },
  };
}

const BRIEF = ["Work out each quantity from what is given here. The figures given are exact and yours alone."];

function tolerancesOf(
  plan: CheckPlan<FormulaParameters>,
  asked: ReturnType<typeof askedQuantities>,
): TolerancePublic[] {
  const worded = plan.parameters.quantities.map(({ id, tolerance }) => [
    id,
    () => `±${formatUnderstood(tolerance.value, tolerance.unit)}`,
  ]);
  return publicTolerances(asked, Object.fromEntries(worded));
}
