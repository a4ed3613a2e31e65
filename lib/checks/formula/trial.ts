import type { Random } from "@/lib/numeric/random";
import type { Answers, CheckPlan, Difficulty, PublicCase, Trial } from "../kind";
import { buildCase } from "./buildCase";
import { drawGivens, LEAST_APART, tolerancesApart, type FormulaTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { FormulaParameters } from "./parameters";
import { solve, writeAll } from "./solve";
import { toleranceAt } from "./tolerances";

type Plan = CheckPlan<FormulaParameters>;

/** How a check of the lead's own is tried. */
export const formulaTrial: Trial<FormulaParameters, FormulaTruth> = {
  whole: true,
  build: buildCase,
  judge: ({ truth }, plan, answers) => markAnswers(truth, plan, answers),
  read: ({ publicCase }, plan, random) =>
    solve(publicCase, plan, new Map(), (value, id) => asPeopleWrite(value, id, plan, random)),
  guess,
  difficulty,
};

/** Rounded to the figures that the tolerance asks for, and one time in three the last of them one off, either way. */
function asPeopleWrite(value: number, id: string, { parameters }: Plan, random: Random): string {
  const quantity = parameters.quantities.find((one) => one.id === id)!;
  const step = lastFigure(toleranceAt(quantity, value));
  const slip = random.pick([-1, 0, 0, 0, 0, 1]);
  return writeAll((Math.round(value / step) + slip) * step, id);
}

/** The largest power of ten that is at most half the tolerance: one figure more than the tolerance shows. */
function lastFigure(tolerance: number): number {
  if (!(tolerance > 0)) return 1;
  let step = 1;
  while (step > tolerance / 2) step /= 10;
  while (step * 10 <= tolerance / 2) step *= 10;
  return step;
}

/** Somebody who knows the formula's usual outcome and not this case: the right values of other givens on the same ranges. */
function guess(publicCase: PublicCase, plan: Plan, random: Random): Answers {
  const others = [...drawGivens(plan.parameters.givens, random)].map(([id, value]) => ({ id, value }));
  return solve({ ...publicCase, data: { givens: others } }, plan);
}

/** How far the nearest wrong way is; beyond a thousand tolerances it makes no difference. */
const FARTHEST = 1000;

function difficulty({ truth }: { truth: FormulaTruth }, { parameters }: Plan): Difficulty[] {
  if (parameters.wrongs.length === 0) return [];
  const nearest = Math.min(FARTHEST, ...parameters.wrongs.map((wrong) => tolerancesApart(parameters, truth, wrong)));
  return [{ label: "Nearest wrong way, in tolerances", unit: "1", value: nearest, from: LEAST_APART, to: FARTHEST }];
}
