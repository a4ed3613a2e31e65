import { captureFiles } from "../captureFiles";
import type { BuiltCase, CheckPlan, Progress } from "../kind";
import { drawCase } from "./drawCase";
import type { FalseLockTruth } from "./drawScene";
import type { FalseLockParameters } from "./parameters";
import { publicCase } from "./publicCase";

/** One capture with sky plot, report, form and files. */
export function buildCase(
  seedHex: string,
  plan: CheckPlan<FalseLockParameters>,
  progress?: Progress,
): BuiltCase<FalseLockTruth> {
  const { truth, capture, draws } = drawCase(seedHex, plan.parameters, progress);
  return { truth, publicCase: publicCase(truth, plan), files: captureFiles(capture, truth.startedAt), draws };
}
