import "server-only";
import type { Answers, BuiltCase, CheckPlan, Marking } from "@/lib/checks/kind";
import type { Tally } from "@/lib/checks/release-check/tally";

/**
 * The signal engine as a command needs it. It computes for seconds, so the worker gives commands one that runs in a
 * thread of its own and tells whoever waits how far it is.
 */
export interface Engine {
  build(seedHex: string, plan: CheckPlan): Promise<BuiltCase>;
  /** `truth` is the rebuilt case's: the command compares it with the one that was drawn. */
  mark(seedHex: string, plan: CheckPlan, answers: Answers): Promise<{ truth: unknown; marking: Marking }>;
}

/** Cases `from` up to, without, `to` of one part of a release check; the engine tries as many as a slice takes, at least one. */
export type SliceTask = { plan: CheckPlan; baseSeedHex: string; part: "case" | "whole"; from: number; to: number };
export type TriedSlice = { tally: Tally; count: number };

/** The engine as the release check needs it. */
export interface TrialEngine {
  trySlice(task: SliceTask): Promise<TriedSlice>;
}
