import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type StandOffTruth } from "./drawCase";
import type { StandOffParameters } from "./parameters";
import { publicCase } from "./publicCase";

/** One site with its form. */
export function buildCase(seedHex: string, plan: CheckPlan<StandOffParameters>): BuiltCase<StandOffTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [], draws };
}
