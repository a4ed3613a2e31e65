import { kindOf } from "@/lib/checks/registry";
import type { Answers, BuiltCase, CheckPlan, Marking, Progress } from "@/lib/checks/kind";
import type { SliceTask, TriedSlice } from "@/lib/commands/engine";
import { trySlice } from "./trySlice";

/** What is asked of the engine; no answers: draw the case; a slice: try cases that nobody sits. */
export type EngineTask = { seedHex: string; plan: CheckPlan; answers: Answers | null } | { slice: SliceTask };
export type EngineResult = { built: BuiltCase } | { truth: unknown; marking: Marking } | { slice: TriedSlice };

/** Draw a case, or draw it again and mark it. Computes for seconds without a pause. */
export function computeCase(task: EngineTask, progress: Progress): EngineResult {
  if ("slice" in task) return { slice: trySlice(task.slice) };
  const { seedHex, plan, answers } = task;
  const kind = kindOf(plan.kind, plan.version);
  const built = kind.build(seedHex, plan, progress);
  if (!answers) return { built };
  return { truth: built.truth, marking: kind.mark(seedHex, plan, answers, progress) };
}
