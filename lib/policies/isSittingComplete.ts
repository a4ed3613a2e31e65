import type { DecidableCase } from "./decidability";
import type { FreshCaseRule } from "./nextCase";

/** Nothing is left to sit before the last day: every check is met, or has used up the cases the release allows. */
export const isSittingComplete = (
  checks: readonly { id: string }[],
  rule: Pick<FreshCaseRule, "freshCases">,
  cases: readonly (DecidableCase & { number: number })[],
): boolean =>
  checks.every(({ id }) => {
    const own = cases.filter(({ checkId }) => checkId === id);
    const used = Math.max(0, ...own.map(({ number }) => number));
    const marked = own.length > 0 && own.every(({ state }) => state === "marked");
    return marked && (own.some(({ met }) => met) || used > rule.freshCases);
  });
