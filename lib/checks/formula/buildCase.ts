import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type FormulaTruth } from "./drawCase";
import type { FormulaParameters } from "./parameters";
import { publicCase } from "./publicCase";

/** One set of givens with its form. */
export function buildCase(seedHex: string, plan: CheckPlan<FormulaParameters>): BuiltCase<FormulaTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [], draws };
}
