import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type CorrelatorReadingTruth } from "./drawCase";
import type { CorrelatorReadingParameters } from "./parameters";
import { publicCase, traceFile } from "./publicCase";

/** One trace with its form and its file. */
export function buildCase(
  seedHex: string,
  plan: CheckPlan<CorrelatorReadingParameters>,
): BuiltCase<CorrelatorReadingTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [traceFile(truth)], draws };
}
