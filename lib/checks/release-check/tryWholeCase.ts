import type { CheckPlan } from "../kind";
import { caseSeed } from "./caseSeed";
import type { Tally } from "./tally";
import { counter, outside, type TriedKind } from "./tryCase";

/** So many are marked as a sitting is; what that adds to `judge`, a search for the workings, takes as long as all the rest. */
const MARKED_IN_FULL = 5;

/** One case as a sitting would have it, samples and all: built, worked by the right method from its files, marked. */
export function tryWholeCase(kind: TriedKind, plan: CheckPlan, baseSeedHex: string, n: number): Tally {
  const seedHex = caseSeed(baseSeedHex, n, "whole");
  const built = kind.build(seedHex, plan);
  const answers = kind.solve(built, plan);
  const marking = n < MARKED_IN_FULL ? kind.mark(seedHex, plan, answers) : kind.trial.judge(built, plan, answers);
  const count = counter(n);
  count.add("whole", marking.met, 0, outside(marking));
  // Of the draws only those of the tried cases are told: these are the same builder's.
  return { ...count.tally(built.draws), built: 0, draws: 0, mostDraws: 0 };
}
