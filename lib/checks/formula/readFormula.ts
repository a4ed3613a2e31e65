import type { Unit } from "@/lib/gnss/units";
import { evaluateExpression } from "./evaluateExpression";
import { ExpressionFault, type Expression } from "./expression";
import { measureExpression } from "./measureExpression";
import { areSame, describe, fromBase, isNothing, measureOf, toBase, type Measure } from "./measures";
import type { FormulaParameters } from "./parameters";
import { parseExpression } from "./parseExpression";

/** Values by name, each in the unit of its given or quantity. */
export type Values = ReadonlyMap<string, number>;

/** A formula that has been read: its text and its value in the unit of its quantity. */
export type ReadFormula = { text: string; names: ReadonlySet<string>; value(values: Values): number };

export type Named = { id: string; unit: Unit };

/**
 * Reads one formula.
 * @param known givens and earlier quantities
 * @param unit that the result is stated in
 * @throws ExpressionFault with what to write instead
 */
export function readFormula(text: string, known: readonly Named[], unit: Unit): ReadFormula {
  const names = new Set(known.map(({ id }) => id));
  const tree = parseExpression(text, names);
  const measure = measureExpression(tree, new Map(known.map((one) => [one.id, measureOf(one.unit)])));
  const misfit = misfitOf(measure, unit);
  if (misfit) throw new ExpressionFault(misfit, tree.at);
  const used = new Set(namesIn(tree));
  return {
    text: text.trim(),
    names: new Set([...names].filter((name) => used.has(name))),
    value(values) {
      const base = new Map(known.map((one) => [one.id, toBase(values.get(one.id) ?? NaN, one.unit)]));
      const value = fromBase(evaluateExpression(tree, base), unit);
      return value === 0 ? 0 : value; // no minus zero
    },
  };
}

/** The formulas of a check by the id of their quantity or wrong method, in the order that they are written. */
export type CheckFormulas = { answers: ReadonlyMap<string, ReadFormula>; wrongs: ReadonlyMap<string, ReadFormula> };

/**
 * All formulas of a check, read once for each plan.
 * @throws ExpressionFault for a plan that the reading of the module should have refused
 */
export function readFormulas(parameters: FormulaParameters): CheckFormulas {
  const earlier = read.get(parameters);
  if (earlier) return earlier;
  const { givens, quantities, wrongs } = parameters;
  const before = (id: string): Named[] => [
    ...givens,
    ...quantities.slice(
      0,
      quantities.findIndex((one) => one.id === id),
    ),
  ];
  const unitOf = new Map(quantities.map(({ id, unit }) => [id, unit]));
  const formulas: CheckFormulas = {
    answers: new Map(quantities.map(({ id, unit, answer }) => [id, readFormula(answer, before(id), unit)])),
    wrongs: new Map(wrongs.map(({ id, of, answer }) => [id, readFormula(answer, before(of), unitOf.get(of) ?? "1")])),
  };
  read.set(parameters, formulas);
  return formulas;
}

// A thousand cases of one plan are drawn, solved and judged in a row; reading is most of the work of each.
const read = new WeakMap<FormulaParameters, CheckFormulas>();

function misfitOf(measure: Measure, unit: Unit): string | null {
  const wanted = measureOf(unit);
  const free = measure.sort === "level" && measure.free;
  if (wanted.sort === "plain") {
    if (free && isNothing(wanted.powers)) return null;
    if (measure.sort === "plain" && areSame(measure.powers, wanted.powers)) return null;
  } else if (measure.sort === "level" && areSame(measure.of, wanted.of) && areSame(measure.per, wanted.per))
    return null;
  const name = unit === "1" ? "a plain number" : unit;
  return `This works out to ${describe(measure)}, and the quantity is in ${name}.${help(measure, wanted)}`;
}

function help(measure: Measure, wanted: Measure): string {
  if (measure.sort === "plain" && wanted.sort === "level") return " 10 * log10(x) makes dB of a plain number x.";
  if (measure.sort === "level" && wanted.sort === "plain") return " 10^(x/10) makes a plain number of x dB.";
  return "";
}

function namesIn(tree: Expression): string[] {
  if (tree.is === "number") return [];
  if (tree.is === "name") return [tree.name];
  if (tree.is === "minus") return namesIn(tree.of);
  return tree.is === "call" ? tree.given.flatMap(namesIn) : [...namesIn(tree.left), ...namesIn(tree.right)];
}
