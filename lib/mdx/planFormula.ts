import { drawCase } from "@/lib/checks/formula/drawCase";
import { ExpressionFault, isConstantName, isFunctionName } from "@/lib/checks/formula/expression";
import {
  MOST_GIVENS,
  MOST_QUANTITIES,
  MOST_WRONGS,
  type FormulaParameters,
  type Given,
  type OwnQuantity,
  type Wrong,
} from "@/lib/checks/formula/parameters";
import { readFormula, type Named } from "@/lib/checks/formula/readFormula";
import type { Unit } from "@/lib/gnss/units";
import { OwnPart, tooMany } from "@/lib/mdx/ownPart";
import type { OwnPlan } from "@/lib/mdx/ownPlans";
import { ownTitle } from "@/lib/mdx/ownTitle";
import { ownTolerance } from "@/lib/mdx/ownTolerance";
import { planGiven } from "@/lib/mdx/planGiven";
import { problemAt, type Problem } from "@/lib/mdx/problem";
import { partsOf, type WrittenCheck, type WrittenPart } from "@/lib/mdx/writtenTag";

/** Givens, quantities and wrong ways of a check of kind `formula`, each formula read with what stands before it. */
export function planFormula(check: WrittenCheck): OwnPlan {
  const problems: Problem[] = [];
  const names = new Set<string>();
  const read = <T>(parts: readonly WrittenPart[], most: number, plan: (part: OwnPart) => T | null): T[] => {
    problems.push(...tooMany(parts, most));
    return parts.slice(0, most).flatMap((written) => {
      const part = new OwnPart(written);
      const planned = plan(part);
      problems.push(...part.problems);
      return planned && part.problems.length === 0 ? [planned] : [];
    });
  };
  const givens = read(partsOf(check, "Given"), MOST_GIVENS, (part) => named(part, names, planGiven(part)));
  const quantities: OwnQuantity[] = [];
  read(partsOf(check, "Quantity"), MOST_QUANTITIES, (part) => {
    const quantity = named(part, names, planQuantity(part, [...givens, ...quantities]));
    if (quantity) quantities.push(quantity);
    return quantity;
  });
  const wrongNames = new Set<string>();
  const wrongs = read(partsOf(check, "Wrong"), MOST_WRONGS, (part) =>
    named(part, wrongNames, planWrong(part, givens, quantities)),
  );
  const planned: FormulaParameters = { givens, quantities, wrongs };
  if (problems.length === 0) problems.push(...caseProblems(check, planned));
  return {
    title: ownTitle(quantities),
    parameters: planned,
    quantities: quantities.map(({ id, tolerance, critical }) => ({ of: id, tolerance, critical })),
    problems,
  };
}

/** One name for one thing, and none that a formula has already. */
function named<T extends { id: string }>(part: OwnPart, names: Set<string>, planned: T | null): T | null {
  if (!planned) return null;
  const { id } = planned;
  if (isConstantName(id)) part.refuse("id", `${id} is a constant of formulas. Choose another id.`);
  else if (isFunctionName(id)) part.refuse("id", `${id} is a function of formulas. Choose another id.`);
  else if (names.has(id)) part.refuse("id", `"${id}" is used twice in this check. Choose another id.`);
  names.add(id);
  return planned;
}

function planQuantity(part: OwnPart, known: readonly Named[]): OwnQuantity | null {
  if (!part.requireOnly(["id", "label", "unit", "answer", "tolerance"], ["critical"])) return null;
  const unit = part.text("unit") as Unit;
  const read = ownTolerance(part.text("tolerance"), unit);
  if ("problem" in read) part.refuse("tolerance", read.problem);
  checkFormula(part, known, unit);
  const [id, label, answer, critical] = [
    part.text("id"),
    part.label(),
    part.text("answer"),
    part.isFlagged("critical"),
  ];
  return "tolerance" in read && part.problems.length === 0
    ? { id, label, unit, answer, tolerance: read.tolerance, critical }
    : null;
}

function planWrong(part: OwnPart, givens: readonly Given[], quantities: readonly OwnQuantity[]): Wrong | null {
  if (!part.requireOnly(["id", "label", "of", "answer"])) return null;
  const of = part.text("of");
  const at = quantities.findIndex(({ id }) => id === of);
  if (at < 0) {
    const known = quantities.map(({ id }) => id).join(", ");
    part.refuse("of", `"${of}" is not a quantity of this check.${known && ` It has ${known}.`}`);
    return null;
  }
  checkFormula(part, [...givens, ...quantities.slice(0, at)], quantities[at]!.unit);
  return { id: part.text("id"), label: part.label(), of, answer: part.text("answer") };
}

function checkFormula(part: OwnPart, known: readonly Named[], unit: Unit): void {
  try {
    readFormula(part.text("answer"), known, unit);
  } catch (error) {
    if (!(error instanceof ExpressionFault)) throw error;
    part.refuse("answer", error.message, error.at);
  }
}

/** Far fewer draws than a case may take: what passes here in all of these does not run out of draws later. */
const DRAWS = 40;
const SEEDS = ["0", "1", "2", "3", "4"].map((digit) => digit.repeat(64));

function caseProblems(check: WrittenCheck, planned: FormulaParameters): Problem[] {
  const refuse = (message: string) => [problemAt(check.range, "own-quantity", message)];
  if (planned.quantities.length === 0)
    return refuse('A check of kind "formula" needs a <Quantity> with its answer inside.');
  if (planned.givens.length === 0)
    return refuse('A check of kind "formula" needs a <Given>: without one every case is the same.');
  try {
    for (const seed of SEEDS) drawCase(seed, planned, DRAWS);
    return [];
  } catch (error) {
    if (error instanceof ExpressionFault) throw error;
    return refuse(
      "Hardly any case of this check is fair: a value cannot be computed, or a wrong way lands by the right value. Narrow the givens or the tolerance.",
    );
  }
}
