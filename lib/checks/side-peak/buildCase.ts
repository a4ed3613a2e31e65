import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type SidePeakTruth } from "./drawCase";
import type { SidePeakParameters } from "./parameters";
import { publicCase, traceFile } from "./publicCase";

/** One trace with its form and its file. */
export function buildCase(seedHex: string, plan: CheckPlan<SidePeakParameters>): BuiltCase<SidePeakTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [traceFile(truth)], draws };
}
