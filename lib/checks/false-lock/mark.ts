import type { Answers, CheckPlan, Marking, Progress } from "../kind";
import { searchCapture } from "../searchCapture";
import { drawCase } from "./drawCase";
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
  const { truth, capture } = drawCase(seedHex, plan.parameters, progress);
  const searched = searchCapture(capture, REFERENCE_SEARCH, progress);
  return markAnswers(truth, plan, answers, searched);
}
