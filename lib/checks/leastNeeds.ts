import type { CheckKind, CheckPlan } from "./kind";

export type LeastNeeds = { needs: number; method: string; misses: string[] };

/**
 * How many quantities a check must need so that none of its kind's wrong methods meets it, and the method that asks for
 * most. A wrong method that misses a critical quantity never meets it; one whose mistakes this check does not ask about
 * cannot be told from the right one. Null when any number will do.
 */
export function leastNeeds(
  { wrongMethods }: Pick<CheckKind, "wrongMethods">,
  quantities: CheckPlan["quantities"],
): LeastNeeds | null {
  let least: LeastNeeds | null = null;
  for (const { label, misses } of Object.values(wrongMethods)) {
    const missed = quantities.filter(({ of }) => misses.includes(of));
    if (missed.length === 0 || missed.some(({ critical }) => critical)) continue;
    const needs = quantities.length - missed.length + 1;
    if (needs > (least?.needs ?? 0)) least = { needs, method: label, misses: missed.map(({ of }) => of) };
  }
  return least;
}
