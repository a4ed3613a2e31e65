import type { Answers, CheckPlan, Marking } from "../kind";
import { drawCase } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { SearchPlanParameters } from "./parameters";

/** Draws the requirement again from its seed and marks the hand-in. */
export const mark = (seedHex: string, plan: CheckPlan<SearchPlanParameters>, answers: Answers): Marking =>
  markAnswers(seedHex, drawCase(seedHex, plan.parameters).truth, plan, answers);
