import { seededRandom, type Random } from "@/lib/numeric/random";
import type { FormulaParameters, Given } from "./parameters";
import { givenValue, stepsOf } from "./givenValues";
import { readFormulas, type CheckFormulas, type Values } from "./readFormula";
import { toleranceAt } from "./tolerances";

/** Values by id, in the units of their givens and quantities. */
export type FormulaTruth = {
  givens: Record<string, number>;
  right: Record<string, number>;
  wrong: Record<string, number>;
};

export type DrawnCase = { truth: FormulaTruth; draws: number };

/** So many tolerances a wrong method must be away from the right value: written figures must not bring it in. */
export const LEAST_APART = 1.5;
/** Beyond it no answer can be typed. */
export const LARGEST = 1e15;

/**
 * Draws the givens until every value can be computed and no wrong method lands by the right one.
 * @param most draws before giving up; the reading of a module asks with fewer, so that a release is far from the bound
 */
export function drawCase(seedHex: string, parameters: FormulaParameters, most = 1000): DrawnCase {
  const formulas = readFormulas(parameters);
  for (let draws = 1; draws <= most; draws++) {
    const random = seededRandom(seedHex, `formula@1/draw-${draws}`);
    const givens = drawGivens(parameters.givens, random);
    const truth = computeCase(parameters, formulas, givens);
    if (isFair(parameters, truth)) return { truth, draws };
  }
  throw new Error(`formula: no fair case in ${most} draws`);
}

export const drawGivens = (givens: readonly Given[], random: Random): Values =>
  new Map(givens.map((given) => [given.id, givenValue(given, random.integer(0, stepsOf(given)))]));

export function computeCase(
  { quantities, wrongs }: FormulaParameters,
  formulas: CheckFormulas,
  givens: Values,
): FormulaTruth {
  const values = new Map(givens);
  for (const { id } of quantities) values.set(id, formulas.answers.get(id)?.value(values) ?? NaN);
  const pick = (ids: readonly { id: string }[]) => Object.fromEntries(ids.map(({ id }) => [id, values.get(id) ?? NaN]));
  return {
    givens: Object.fromEntries(givens),
    right: pick(quantities),
    wrong: Object.fromEntries(wrongs.map(({ id }) => [id, formulas.wrongs.get(id)?.value(values) ?? NaN])),
  };
}

function isFair(parameters: FormulaParameters, truth: FormulaTruth): boolean {
  const computable = [...Object.values(truth.right), ...Object.values(truth.wrong)];
  if (!computable.every((value) => Math.abs(value) < LARGEST)) return false;
  const positive = parameters.quantities.every((one) => toleranceAt(one, truth.right[one.id]) > 0);
  return positive && parameters.wrongs.every((wrong) => tolerancesApart(parameters, truth, wrong) >= LEAST_APART);
}

/** How far a wrong method's value is from the right one, in tolerances. */
export function tolerancesApart(
  { quantities }: FormulaParameters,
  { right, wrong }: FormulaTruth,
  { id, of }: { id: string; of: string },
): number {
  const quantity = quantities.find((one) => one.id === of);
  return quantity ? Math.abs(wrong[id] - right[of]) / toleranceAt(quantity, right[of]) : NaN;
}
