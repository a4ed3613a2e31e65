import { answerOf } from "../answerOf";
import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { parseQuantity } from "../parseQuantity";
import { LARGEST, type FormulaTruth } from "./drawCase";
import type { FormulaParameters, OwnQuantity } from "./parameters";
import { SECTION } from "./publicCase";
import { formulaQuantities } from "./quantities";
import { readFormulas, type CheckFormulas, type Values } from "./readFormula";
import { decimalsFor, toleranceAt } from "./tolerances";
import { workingsOf } from "./workings";

/** Judges each quantity against the right value, worked out from the candidate's own earlier values where there are any. */
export function markAnswers(truth: FormulaTruth, plan: CheckPlan<FormulaParameters>, answers: Answers): Marking {
  const asked = askedQuantities(formulaQuantities(plan), plan);
  const formulas = readFormulas(plan.parameters);
  const own = new Map(Object.entries({ ...truth.givens, ...truth.right }));
  const rows = plan.parameters.quantities.flatMap((quantity): MarkedRow[] => {
    const typed = answerOf(answers, `${SECTION}.${quantity.id}`);
    const computed = computedFrom(own, truth, formulas, quantity.id);
    const definition = asked.get(quantity.id);
    const row = definition && markOne({ quantity, definition, typed, computed, formulas, own }, plan.parameters);
    const reading = parseQuantity(typed, quantity.unit);
    // What cannot be read is taken as right for what follows, so that one slip of the pen counts once.
    own.set(quantity.id, "value" in reading ? reading.value : computed);
    return row ? [row] : [];
  });
  return finishMarking({ id: "formula", version: 1 }, plan, asked, rows, workingsOf(truth, plan.parameters));
}

/** From the candidate's own values; from the right ones where those lead nowhere, such as a root of a negative number. */
function computedFrom(own: Values, { right }: FormulaTruth, { answers }: CheckFormulas, id: string): number {
  const value = answers.get(id)?.value(own) ?? NaN;
  return Math.abs(value) < LARGEST ? value : right[id];
}

type Line = {
  quantity: OwnQuantity;
  definition: AskedQuantity;
  typed: string;
  computed: number;
  formulas: CheckFormulas;
  own: Values;
};

function markOne(
  { quantity, definition, typed, computed, formulas, own }: Line,
  parameters: FormulaParameters,
): MarkedRow {
  const tolerance = toleranceAt(quantity, computed);
  return markNumber({
    quantity: definition,
    typed,
    computed,
    unit: quantity.unit,
    decimals: decimalsFor(tolerance),
    tolerance,
    toleranceText: `±${formatUnderstood(quantity.tolerance.value, quantity.tolerance.unit)}`,
    explain(value): Finding | null {
      const near = (other: number) => Math.abs(value - other) <= toleranceAt(quantity, other);
      const wrong = parameters.wrongs.find(
        ({ id, of }) => of === quantity.id && near(formulas.wrongs.get(id)?.value(own) ?? NaN),
      );
      if (wrong)
        return { errorClass: wrong.label, reason: `This is the value that a known wrong way gives: ${wrong.label}.` };
      if (!near(-computed)) return null;
      return { errorClass: "sign", reason: "The size agrees; the sign does not." };
    },
  });
}
