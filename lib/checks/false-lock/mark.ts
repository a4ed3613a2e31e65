import type { Answers, CheckPlan, Marking, Progress } from "../kind";
import { searchCapture } from "../searchCapture";
import { makeCapture } from "./buildCase";
import { drawScene } from "./drawScene";
import { markAnswers } from "./markAnswers";
import type { FalseLockParameters } from "./parameters";
import { REFERENCE_SEARCH } from "./referenceSearch";

/** Makes the capture again from its seed, searches it for all satellites and marks the hand-in. */
export function mark(
  seedHex: string,
  plan: CheckPlan<FalseLockParameters>,
  answers: Answers,
  progress?: Progress,
): Marking {
  const { truth } = drawScene(seedHex, plan.parameters);
  const searched = searchCapture(makeCapture(seedHex, truth, progress), REFERENCE_SEARCH, progress);
  return markAnswers(truth, plan, answers, searched);
}
