import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type LocateTruth } from "./drawCase";
import type { LocateParameters } from "./parameters";
import { logFile, publicCase } from "./publicCase";

/** One patrol log with its form and its file. */
export function buildCase(seedHex: string, plan: CheckPlan<LocateParameters>): BuiltCase<LocateTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [logFile(truth)], draws };
}
