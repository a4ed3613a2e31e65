import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type ChainTruth } from "./drawCase";
import type { ChainParameters } from "./parameters";
import { publicCase } from "./publicCase";

/** One site with its list of parts. */
export function buildCase(seedHex: string, plan: CheckPlan<ChainParameters>): BuiltCase<ChainTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [], draws };
}
