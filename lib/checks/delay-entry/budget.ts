import { cableDelayNs } from "@/lib/gnss/chain/cableDelay";
import { delayBudget, uncertaintyOfLimit, type DelayBudget } from "@/lib/gnss/timing/delayBudget";
import type { SitePart, StatedUncertainty } from "./site";

/** One-way delay of a run from what is measured at its near end: half of what the run adds to the echo. */
export const runOfEchoesNs = (leadNs: number, endNs: number): number => (endNs - leadNs) / 2;

/** Delay of a part as its papers give it, or `measuredNs` where they say nothing. */
export function delayOfPart({ paper }: SitePart, measuredNs: number): number {
  if (paper.says === "delay") return paper.ns;
  return paper.says === "cable" ? cableDelayNs(paper.installedM, paper.velocityFactor) : measuredNs;
}

/** Stated amount in ns, limits still as limits. */
export const statedNs = ({ value, unit }: StatedUncertainty, delayNs: number): number =>
  unit === "%" ? (value / 100) * Math.abs(delayNs) : value;

/** Standard uncertainty; limits by JCGM 100:2008, 4.3.7. */
export const standardNs = (stated: StatedUncertainty, delayNs: number): number =>
  stated.as === "limits" ? uncertaintyOfLimit(statedNs(stated, delayNs)) : statedNs(stated, delayNs);

export type CountedPart = { part: SitePart; ns: number };

/** Total and its standard uncertainty; the parts err independently, as the brief says. JCGM 100:2008, 5.1.2. */
export const budgetOf = (counted: readonly CountedPart[], uncertaintyOf = standardNs): DelayBudget =>
  delayBudget(
    counted.map(({ part, ns }) => ({ ns, uncertaintyNs: uncertaintyOf(part.uncertainty, ns), sharedCause: null })),
  );
