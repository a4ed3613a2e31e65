import type { Answers, CheckPlan, Marking } from "../kind";
import { drawCase } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { InterfererParameters } from "./parameters";

/** Draws the capture again from its seed and marks the hand-in. */
export const mark = (seedHex: string, plan: CheckPlan<InterfererParameters>, answers: Answers): Marking =>
  markAnswers(drawCase(seedHex, plan.parameters).truth, plan, answers);
