import type { Answers, CheckPlan, Marking, Progress } from "../kind";
import { searchCapture } from "../searchCapture";
import { drawCase } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { FalseLockParameters } from "./parameters";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { STRONG_FROM_DBHZ, unborrowedPeak } from "./unborrowedPeak";

/** Makes the capture again from its seed, searches it for all satellites and marks the hand-in. */
export function mark(
  seedHex: string,
  plan: CheckPlan<FalseLockParameters>,
  answers: Answers,
  progress?: Progress,
): Marking {
  const { truth, capture } = drawCase(seedHex, plan.parameters, progress);
  const searched = searchCapture(capture, REFERENCE_SEARCH, progress);
  const strong = searched.filter(({ found, cn0DbHz }) => found && cn0DbHz >= STRONG_FROM_DBHZ);
  const weakPeak = unborrowedPeak(capture, truth.weakPrn, REFERENCE_SEARCH, strong);
  return markAnswers(truth, plan, answers, { searched, weakPeak });
}
