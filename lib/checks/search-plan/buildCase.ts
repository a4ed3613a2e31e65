import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type SearchPlanTruth } from "./drawCase";
import type { SearchPlanParameters } from "./parameters";
import { publicCase } from "./publicCase";

/** One requirement with its form. */
export function buildCase(seedHex: string, plan: CheckPlan<SearchPlanParameters>): BuiltCase<SearchPlanTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [], draws };
}
