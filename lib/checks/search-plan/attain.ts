import type { PlanPerformance } from "@/lib/gnss/searchPlan";
import { seededRandom } from "@/lib/numeric/random";
import type { SearchPlanTruth } from "./drawCase";
import { losslessDetection, performanceOf, type Plan } from "./planGrid";

export type Attained = PlanPerformance & { lossless: number };

const DRAWS = 5000; // standard error 0.3 points at a detection of 95 %

/** What the candidate's own plan attains against the case's requirement; the draws come from the case's seed. */
export function attain(
  seedHex: string,
  { requirement }: SearchPlanTruth,
  plan: Plan & { thresholdSigma2: number },
): Attained {
  const random = seededRandom(seedHex, "search-plan@1/marking");
  const performance = performanceOf(plan, requirement, plan.thresholdSigma2, DRAWS, random);
  return { ...performance, lossless: losslessDetection(plan, requirement, plan.thresholdSigma2) };
}
