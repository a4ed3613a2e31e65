import type { Answers, CheckPlan, Marking } from "../kind";
import { drawCase } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { ChainParameters } from "./parameters";

/** Draws the site again from its seed and marks the hand-in. */
export const mark = (seedHex: string, plan: CheckPlan<ChainParameters>, answers: Answers): Marking =>
  markAnswers(drawCase(seedHex, plan.parameters).truth, plan, answers);
