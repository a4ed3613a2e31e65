import type { CheckPlan } from "@/lib/checks/kind";
import { FULL_CASES, WHOLE_CASES } from "@/lib/checks/release-check/rule";
import { addTallies, emptyTally, type Tally } from "@/lib/checks/release-check/tally";
import { tryCase, type TriedKind } from "@/lib/checks/release-check/tryCase";
import { tryWholeCase } from "@/lib/checks/release-check/tryWholeCase";
import { releaseCheckFingerprint } from "./releaseCheckFingerprint";

/** In the demonstration's first module this kind is tried by the worker, in seconds; the others were computed before. */
export const LEFT_TO_THE_WORKER = "side-peak";

/** A release check that was computed once and is kept as a file, in parts that can be computed again one by one. */
export type ComputedCheck = {
  fingerprint: string;
  engineVersion: string;
  plan: Pick<CheckPlan, "kind" | "version" | "parameters" | "quantities" | "needs">;
  cases: ComputedPart[];
  whole: ComputedPart[];
};

/** Cases `from` up to, without, `to`. */
export type ComputedPart = { from: number; to: number; tally: Tally };

const FIRST_CASES = 3;

/** The parts of a whole release check of this kind, none computed. */
export const partsOf = (kind: TriedKind): Record<"cases" | "whole", Omit<ComputedPart, "tally">[]> => ({
  // The first few alone, for the test that computes a part again.
  cases: [{ from: 0, to: FIRST_CASES }, { from: FIRST_CASES, to: 25 }, ...inParts(FULL_CASES, 25).slice(1)],
  whole: kind.trial.whole ? [] : inParts(WHOLE_CASES, 1),
});

const inParts = (count: number, size: number) =>
  Array.from({ length: count / size }, (_, n) => ({ from: n * size, to: (n + 1) * size }));

export function computePart(
  kind: TriedKind,
  plan: CheckPlan,
  part: "cases" | "whole",
  { from, to }: Omit<ComputedPart, "tally">,
): ComputedPart {
  const one = part === "whole" ? tryWholeCase : tryCase;
  let tally = emptyTally();
  for (let n = from; n < to; n++) tally = addTallies(tally, one(kind, plan, releaseCheckFingerprint(plan), n));
  return { from, to, tally };
}

export const sumOf = ({ cases, whole }: Pick<ComputedCheck, "cases" | "whole">): Tally =>
  [...cases, ...whole].reduce((sum, { tally }) => addTallies(sum, tally), emptyTally());
