import type { CheckPlan } from "@/lib/checks/kind";
import { FULL_CASES, PREVIEW_CASES, WHOLE_CASES } from "@/lib/checks/release-check/rule";
import { triedKind } from "./triedKind";

/** How many cases a release check tries, and how many of them whole; a preview leaves the whole ones out. */
export const casesOf = (plan: CheckPlan, preview: boolean): { cases: number; whole: number } => ({
  cases: preview ? PREVIEW_CASES : FULL_CASES,
  whole: !preview && triedKind(plan)?.trial.whole === false ? WHOLE_CASES : 0,
});
