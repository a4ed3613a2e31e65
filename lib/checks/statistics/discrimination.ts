import { pointBiserial } from "@/lib/numeric/pointBiserial";
import type { CountedCase } from "./checkStatistics";

/**
 * Sittings below which nothing is said: the standard error of a correlation near 0 is about 1/sqrt(N), 0.18 at 30.
 * Common practice, no source.
 */
export const LEAST_SITTINGS = 30;

/** The correlation, or why there is none: too few sittings, all cases or all other checks alike, no other check. */
export type Discrimination = number | "too few" | "alike" | "only check";

/**
 * How far a check tells those who meet the others from those who do not: point-biserial correlation of its being met with the
 * share of the sitting's other checks that were met. From memory; handbooks of psychometrics call it a corrected one, since
 * the check itself is left out of the share.
 * @param first the first case of each check in each sitting
 */
export function discrimination(
  checkId: string,
  checkIds: readonly string[],
  first: readonly Pick<CountedCase, "sittingId" | "checkId" | "met">[],
): Discrimination {
  if (checkIds.length < 2) return "only check";
  const shares = sharesOfOthers(checkId, first);
  const own = first.filter((one) => one.checkId === checkId && shares.has(one.sittingId));
  if (own.length < LEAST_SITTINGS) return "too few";
  const share = own.map(({ sittingId }) => shares.get(sittingId)!);
  return (
    pointBiserial(
      own.map(({ met }) => met),
      share,
    ) ?? "alike"
  );
}

/** By sitting; a sitting in which no other check was marked has none. */
function sharesOfOthers(checkId: string, first: readonly Pick<CountedCase, "sittingId" | "checkId" | "met">[]) {
  const others = new Map<string, { marked: number; met: number }>();
  for (const { sittingId, checkId: other, met } of first) {
    if (other === checkId) continue;
    const { marked, met: before } = others.get(sittingId) ?? { marked: 0, met: 0 };
    others.set(sittingId, { marked: marked + 1, met: before + (met ? 1 : 0) });
  }
  return new Map([...others].map(([sittingId, { marked, met }]) => [sittingId, met / marked]));
}
