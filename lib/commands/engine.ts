import "server-only";
import type { Answers, BuiltCase, CheckPlan, Marking } from "@/lib/checks/kind";

/**
 * The signal engine as a command needs it. It computes for seconds, so the worker gives commands one that runs in a
 * thread of its own and tells whoever waits how far it is.
 */
export interface Engine {
  build(seedHex: string, plan: CheckPlan): Promise<BuiltCase>;
  /** `truth` is the rebuilt case's: the command compares it with the one that was drawn. */
  mark(seedHex: string, plan: CheckPlan, answers: Answers): Promise<{ truth: unknown; marking: Marking }>;
}
