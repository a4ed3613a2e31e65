import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { CheckPlan } from "@/lib/checks/kind";
import { FULL_CASES, WHOLE_CASES } from "@/lib/checks/release-check/rule";
import { addTallies, emptyTally, type Tally } from "@/lib/checks/release-check/tally";
import { tryCase, type TriedKind } from "@/lib/checks/release-check/tryCase";
import { tryWholeCase } from "@/lib/checks/release-check/tryWholeCase";
import { releaseCheckFingerprint } from "./releaseCheckFingerprint";

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

/** The parts of a whole release check of this kind, none computed. */
export const partsOf = (kind: TriedKind): Record<"cases" | "whole", Omit<ComputedPart, "tally">[]> => ({
  cases: inParts(FULL_CASES, 25),
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

/** Whether a file is of this plan, by this engine, and whole. */
export function isOf(computed: ComputedCheck, plan: CheckPlan, kind: TriedKind): boolean {
  const parts = partsOf(kind);
  return (
    computed.fingerprint === releaseCheckFingerprint(plan) &&
    computed.engineVersion === ENGINE_VERSION &&
    computed.cases.length === parts.cases.length &&
    computed.whole.length === parts.whole.length
  );
}
