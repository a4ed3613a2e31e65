import { captureFiles } from "../captureFiles";
import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type InterfererTruth } from "./drawCase";
import type { InterfererParameters } from "./parameters";
import { publicCase } from "./publicCase";

/** One capture with its form and its files. */
export function buildCase(seedHex: string, plan: CheckPlan<InterfererParameters>): BuiltCase<InterfererTruth> {
  const { truth, capture, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: captureFiles(capture, truth.startedAt), draws };
}
