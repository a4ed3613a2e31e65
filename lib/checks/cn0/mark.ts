import type { Answers, CheckPlan, Marking } from "../kind";
import { drawCase } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { Cn0Parameters } from "./parameters";

/** Draws the prompts again from their seed and marks the hand-in. */
export const mark = (seedHex: string, plan: CheckPlan<Cn0Parameters>, answers: Answers): Marking =>
  markAnswers(drawCase(seedHex, plan.parameters).truth, plan, answers);
