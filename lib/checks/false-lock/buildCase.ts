import type { Capture } from "@/lib/gnss/acquire";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import { captureFiles } from "../captureFiles";
import type { BuiltCase, CheckPlan, Progress } from "../kind";
import { drawScene, type FalseLockTruth } from "./drawScene";
import type { FalseLockParameters } from "./parameters";
import { publicCase } from "./publicCase";

/** One capture with sky plot, report, form and files. */
export function buildCase(
  seedHex: string,
  plan: CheckPlan<FalseLockParameters>,
  progress?: Progress,
): BuiltCase<FalseLockTruth> {
  const { truth, draws } = drawScene(seedHex, plan.parameters);
  const capture = makeCapture(seedHex, truth, progress);
  return { truth, publicCase: publicCase(truth, plan), files: captureFiles(capture, truth.startedAt), draws };
}

export function makeCapture(seedHex: string, { scene }: FalseLockTruth, progress?: Progress): Capture {
  const noise = seededRandom(seedHex, "false-lock@1/noise");
  const { samples } = synthesizeCi8(scene, noise, (done, total) => progress?.(done, total, "Making the capture"));
  return { samples, rateHz: scene.rateHz };
}
