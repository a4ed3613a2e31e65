import { drawScene, type FalseLockTruth } from "@/lib/checks/false-lock/drawScene";
import { falseLock } from "@/lib/checks/false-lock/falseLock";
import type { FalseLockParameters } from "@/lib/checks/false-lock/parameters";
import { planOf } from "../planOf";

/** The first scene of a seed that can be judged, without its capture, and how many were drawn. */
export function sceneFor(
  seed: string,
  over: Partial<FalseLockParameters> = {},
): { truth: FalseLockTruth; draws: number } {
  const { parameters } = planOf(falseLock, over);
  for (let draws = 1; ; draws++) {
    const truth = drawScene(seed, parameters, draws);
    if (truth) return { truth, draws };
  }
}
