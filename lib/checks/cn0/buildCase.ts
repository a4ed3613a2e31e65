import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type Cn0Truth } from "./drawCase";
import type { Cn0Parameters } from "./parameters";
import { promptsFile, publicCase } from "./publicCase";

/** Four channels of prompts with their form and their file. */
export function buildCase(seedHex: string, plan: CheckPlan<Cn0Parameters>): BuiltCase<Cn0Truth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [promptsFile(truth)], draws };
}
