import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type DelayEntryTruth } from "./drawCase";
import type { DelayEntryParameters } from "./parameters";
import { echoFile, publicCase } from "./publicCase";

/** One site with its form and its traces. */
export function buildCase(seedHex: string, plan: CheckPlan<DelayEntryParameters>): BuiltCase<DelayEntryTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [echoFile(truth)], draws };
}
