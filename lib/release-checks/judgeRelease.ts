import type { CheckPlan } from "@/lib/checks/kind";
import { judgeTally, type LineVerdict } from "@/lib/checks/release-check/judgeTally";
import {
  sittingRates,
  type CheckRates,
  type Required,
  type SittingRates,
} from "@/lib/checks/release-check/sittingRates";
import type { Tally } from "@/lib/checks/release-check/tally";
import { releaseCheckFingerprint } from "./releaseCheckFingerprint";
import { triedKind } from "./triedKind";

/** A check of a draft with what is known of it: `lines` null until its release check has finished. */
export type JudgedCheck = {
  plan: CheckPlan;
  /** Null where people judge: such a check needs no release check. */
  fingerprint: string | null;
  lines: LineVerdict[] | null;
  within: boolean;
};

/** The checks of a module against their bounds, and the sitting as a whole once all of them have finished. */
export function judgeRelease(
  plans: readonly CheckPlan[],
  rule: { require: Required; sitting: { freshCases: number } },
  tallies: ReadonlyMap<string, Tally>,
): { checks: JudgedCheck[]; sitting: SittingRates | null } {
  const checks = plans.map((plan) => judgeCheck(plan, tallies));
  const finished = checks.every(({ fingerprint, lines }) => fingerprint === null || lines !== null);
  return {
    checks,
    sitting: finished ? sittingRates(rule.require, rule.sitting.freshCases, checks.map(ratesOf)) : null,
  };
}

/** A tally against the bounds of its kind; none where people judge. */
export function linesOf(plan: CheckPlan, tally: Tally): LineVerdict[] {
  const kind = triedKind(plan);
  return kind ? judgeTally(kind, plan, tally) : [];
}

function judgeCheck(plan: CheckPlan, tallies: ReadonlyMap<string, Tally>): JudgedCheck {
  const kind = triedKind(plan);
  if (!kind) return { plan, fingerprint: null, lines: null, within: true };
  const fingerprint = releaseCheckFingerprint(plan);
  const tally = tallies.get(fingerprint);
  const lines = tally ? linesOf(plan, tally) : null;
  return { plan, fingerprint, lines, within: lines !== null && lines.every((line) => line.within) };
}

const ratesOf = ({ plan, lines }: JudgedCheck): CheckRates => {
  const rate = (id: string) => lines?.find((line) => line.id === id)?.rate ?? null;
  return { id: plan.id, read: rate("read"), guess: rate("guess") };
};
