import type { BuiltCase, CheckPlan } from "../kind";
import { drawCase, type PulseAcceptanceTruth } from "./drawCase";
import type { PulseAcceptanceParameters } from "./parameters";
import { logFile, publicCase } from "./publicCase";

/** One log with its form. */
export function buildCase(
  seedHex: string,
  plan: CheckPlan<PulseAcceptanceParameters>,
): BuiltCase<PulseAcceptanceTruth> {
  const { truth, draws } = drawCase(seedHex, plan.parameters);
  return { truth, publicCase: publicCase(truth, plan), files: [logFile(truth)], draws };
}
