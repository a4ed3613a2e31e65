import type { Capture } from "@/lib/gnss/acquire";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import type { Progress } from "../kind";
import { drawScene, type FalseLockTruth } from "./drawScene";
import { isReadable } from "./isReadable";
import type { FalseLockParameters } from "./parameters";

const MOST_DRAWS = 20_000;
const NO_CASE = `false-lock: no case that can be judged in ${MOST_DRAWS} draws`;

/** The first scene of a seed that can be judged, whatever its capture would show. */
export function firstScene(seedHex: string, parameters: FalseLockParameters): { truth: FalseLockTruth; draws: number } {
  for (let draws = 1; draws <= MOST_DRAWS; draws++) {
    const truth = drawScene(seedHex, parameters, draws);
    if (truth) return { truth, draws };
  }
  throw new Error(NO_CASE);
}

export type DrawnCase = { truth: FalseLockTruth; capture: Capture; draws: number };

/** Draws scenes until one can be judged and a right search of its capture, noise included, reads what the two codes predict. */
export function drawCase(seedHex: string, parameters: FalseLockParameters, progress?: Progress): DrawnCase {
  for (let draws = 1; draws <= MOST_DRAWS; draws++) {
    const truth = drawScene(seedHex, parameters, draws);
    if (!truth) continue;
    const noise = seededRandom(seedHex, `false-lock@1/noise-${draws}`);
    const { samples } = synthesizeCi8(truth.scene, noise, (done, total) =>
      progress?.(done, total, "Making the capture"),
    );
    const capture = { samples, rateHz: truth.scene.rateHz };
    if (isReadable(truth, capture)) return { truth, capture, draws };
  }
  throw new Error(NO_CASE);
}
