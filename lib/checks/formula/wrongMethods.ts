import type { CheckPlan, WrongMethod } from "../kind";
import type { FormulaTruth } from "./drawCase";
import type { FormulaParameters } from "./parameters";
import { readFormulas } from "./readFormula";
import { solve } from "./solve";

/** The lead's wrong methods: the right way but for the one quantity, with what follows from it worked out rightly. */
export function formulaWrongMethods({
  parameters,
}: CheckPlan<FormulaParameters>): Record<string, WrongMethod<FormulaParameters, FormulaTruth>> {
  const { wrongs } = readFormulas(parameters);
  const entries = parameters.wrongs.map(({ id, label, of }) => {
    const formula = wrongs.get(id);
    const replaced = new Map(formula ? [[of, formula]] : []);
    const method: WrongMethod<FormulaParameters, FormulaTruth> = {
      label,
      misses: [of],
      solve: ({ publicCase }, plan) => solve(publicCase, plan, replaced),
    };
    return [id, method] as const;
  });
  return Object.fromEntries(entries);
}
