import type { PlanPerformance } from "@/lib/gnss/searchPlan";
import { seededRandom } from "@/lib/numeric/random";
import type { SearchPlanTruth } from "./drawCase";
import { losslessDetection, performanceOf, quickDetection, type Plan } from "./planGrid";

export type Attained = PlanPerformance & { lossless: number };

const DRAWS = 5000; // standard error 0.3 points at a detection of 95 %

type Attain = (seedHex: string, truth: SearchPlanTruth, plan: Plan & { thresholdSigma2: number }) => Attained;

/** The same from a curve instead of draw by draw: within 1e-6 of it (`planDetection`), for thousands of hand-ins. */
export const attainQuickly: Attain = (seedHex, { requirement }, plan) => {
  const random = () => seededRandom(seedHex, "search-plan@1/marking");
  const counts = performanceOf(plan, requirement, plan.thresholdSigma2, FEWEST_DRAWS, random());
  const detection = quickDetection(plan, requirement, plan.thresholdSigma2, DRAWS, random());
  return { ...counts, detection, lossless: losslessDetection(plan, requirement, plan.thresholdSigma2) };
};

const FEWEST_DRAWS = 2; // cells, false alarms and time need none

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
