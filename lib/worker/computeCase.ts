import { kindOf } from "@/lib/checks/registry";
import type { Answers, BuiltCase, CheckPlan, Marking, Progress } from "@/lib/checks/kind";

/** What is asked of the engine; no answers: draw the case. */
export type EngineTask = { seedHex: string; plan: CheckPlan; answers: Answers | null };
export type EngineResult = { built: BuiltCase } | { truth: unknown; marking: Marking };

/** Draw a case, or draw it again and mark it. Computes for seconds without a pause. */
export function computeCase({ seedHex, plan, answers }: EngineTask, progress: Progress): EngineResult {
  const kind = kindOf(plan.kind, plan.version);
  const built = kind.build(seedHex, plan, progress);
  if (!answers) return { built };
  return { truth: built.truth, marking: kind.mark(seedHex, plan, answers, progress) };
}
