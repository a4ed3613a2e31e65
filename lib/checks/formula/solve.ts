import type { Answers, CheckPlan, PublicCase } from "../kind";
import type { FormulaParameters } from "./parameters";
import { SECTION } from "./publicCase";
import { readFormulas, type ReadFormula } from "./readFormula";

/** A value as it is written into the form, given the quantity it is of. */
export type Write = (value: number, quantityId: string) => string;

/** Nine figures: more than any tolerance asks for. */
export const writeAll: Write = (value) => String(Number(value.toPrecision(9)));

/**
 * Works the quantities out one after the other from the figures in the public case, each from what was written before.
 * @param replaced formulas that are used in place of the right ones, by quantity
 */
export function solve(
  { data }: PublicCase,
  { parameters }: CheckPlan<FormulaParameters>,
  replaced: ReadonlyMap<string, ReadFormula> = new Map(),
  write = writeAll,
): Answers {
  const { answers } = readFormulas(parameters);
  const values = new Map((data.givens as { id: string; value: number }[]).map(({ id, value }) => [id, value]));
  const written = parameters.quantities.map(({ id }) => {
    const text = write((replaced.get(id) ?? answers.get(id))?.value(values) ?? NaN, id);
    values.set(id, Number(text));
    return [`${SECTION}.${id}`, text];
  });
  return Object.fromEntries(written);
}
