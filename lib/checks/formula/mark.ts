import type { Answers, CheckPlan, Marking } from "../kind";
import { drawCase } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { FormulaParameters } from "./parameters";

/** Draws the givens again from their seed and marks the hand-in. */
export const mark = (seedHex: string, plan: CheckPlan<FormulaParameters>, answers: Answers): Marking =>
  markAnswers(drawCase(seedHex, plan.parameters).truth, plan, answers);
