import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type SkyViewTruth } from "./drawCase";
import type { SkyViewParameters } from "./parameters";
import { horizonFile, publicCase } from "./publicCase";

/** Three positions of one roof, with their horizons as a file. */
export function buildCase(seedHex: string, plan: CheckPlan<SkyViewParameters>): BuiltCase<SkyViewTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [horizonFile(truth)], draws };
}
