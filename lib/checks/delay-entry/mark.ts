import type { Answers, CheckPlan, Marking } from "../kind";
import { drawCase } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { DelayEntryParameters } from "./parameters";

/** Draws the site again from its seed and marks the hand-in. */
export const mark = (seedHex: string, plan: CheckPlan<DelayEntryParameters>, answers: Answers): Marking =>
  markAnswers(drawCase(seedHex, plan.parameters).truth, plan, answers);
