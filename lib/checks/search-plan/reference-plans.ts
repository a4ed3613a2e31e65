import { seededRandom } from "@/lib/numeric/random";
import { losslessDetection, performanceOf, planGrid, thresholdFor, type Rated, type Requirement } from "./planGrid";

export type ReferencePlan = Rated & { thresholdSigma2: number; detection: number };

const DRAWS = 300; // a point of standard error at most; only the fairness of a case hangs on it
const STREAM_SEED = "5ea7c4".padEnd(64, "0"); // the same draws for every plan and every case, so that plans compare evenly

/** Fastest plan of the grid that detects as required; null when none does. */
export function fastestPlan(requirement: Requirement): ReferencePlan | null {
  for (const plan of planGrid(requirement)) {
    const rated = ratePlan(plan, requirement, requirement.detection);
    if (rated) return rated;
  }
  return null;
}

/** Plans of the grid that detect at least so much within the time, the fastest first. */
export function plansWithin(requirement: Requirement, detection: number, timeLimitS: number): ReferencePlan[] {
  const inTime = planGrid(requirement).filter(({ timeS }) => timeS <= timeLimitS);
  return inTime.flatMap((plan) => ratePlan(plan, requirement, detection) ?? []);
}

/** Null when the plan detects less than asked; a plan that fails without any loss is not drawn for. */
function ratePlan(plan: Rated, requirement: Requirement, detection: number): ReferencePlan | null {
  const threshold = thresholdFor(plan, requirement);
  if (losslessDetection(plan, requirement, threshold) < detection) return null;
  const attained = attainedBy(plan, requirement, threshold);
  return attained < detection ? null : { ...plan, thresholdSigma2: threshold, detection: attained };
}

function attainedBy(plan: Rated, requirement: Requirement, threshold: number): number {
  if (!isSame(requirement, latest.requirement)) latest = { requirement, attained: new Map() };
  const { coherentMs, sums, dopplerBinHz, codeStepChips } = plan;
  const name = [coherentMs, sums, dopplerBinHz, codeStepChips].join();
  const known = latest.attained.get(name);
  if (known !== undefined) return known;
  const random = seededRandom(STREAM_SEED, "search-plan@1/grid");
  const { detection } = performanceOf(plan, requirement, threshold, DRAWS, random);
  latest.attained.set(name, detection);
  return detection;
}

/** A case is drawn, worked and worked wrongly on the same grid: what its plans attain is kept until another requirement comes. */
let latest: { requirement: Requirement | null; attained: Map<string, number> } = {
  requirement: null,
  attained: new Map(),
};

const isSame = (a: Requirement, b: Requirement | null): boolean =>
  b !== null && a.cn0DbHz === b.cn0DbHz && a.windowHz === b.windowHz && a.falseAlarmPerSearch === b.falseAlarmPerSearch; // all that the detection of a plan hangs on
