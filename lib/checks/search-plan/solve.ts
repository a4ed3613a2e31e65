import { falseAlarmOfThreshold, falseAlarmPerSearch } from "@/lib/gnss/detection";
import { seededRandom } from "@/lib/numeric/random";
import type { Answers, PublicCase } from "../kind";
import { cellsOf, performanceOf, type Plan, type Rated, type Requirement } from "./planGrid";
import { plansWithin } from "./reference-plans";

const DRAWS = 2000;
const SEED = "501e".padEnd(64, "0");

/** The right method, from the requirement alone: of the plans in time, the one that detects most; estimates from draws. */
export function solve(publicCase: PublicCase): Answers {
  const requirement = requirementOf(publicCase);
  const inTime = plansWithin(requirement, requirement.detection - 0.01, publicCase.data.timeLimitS as number);
  const best = inTime.reduce((a, b) => (b.detection > a.detection ? b : a));
  const threshold = roundedUp(best.thresholdSigma2);
  const random = seededRandom(SEED, "estimate");
  const { detection } = performanceOf(best, requirement, threshold, DRAWS, random);
  return answersFor(best, requirement, threshold, detection);
}

export function requirementOf({ data }: PublicCase): Requirement {
  return {
    cn0DbHz: data.cn0DbHz as number,
    windowHz: data.windowHz as number,
    detection: (data.detectionPercent as number) / 100,
    falseAlarmPerSearch: data.falseAlarmPerSearch as number,
    correlators: data.correlators as number,
  };
}

export function answersFor(plan: Rated, requirement: Requirement, threshold: number, detection: number): Answers {
  const perSearch = falseAlarmPerSearch(falseAlarmOfThreshold(threshold, plan.sums), cellsOf(plan, requirement));
  return {
    ...planAnswers(plan, threshold),
    "estimate.detection": `${(detection * 100).toFixed(0)} %`,
    "estimate.falseAlarm": perSearch.toPrecision(2),
    "estimate.time": plan.timeS.toPrecision(3),
  };
}

const planAnswers = ({ coherentMs, sums, dopplerBinHz, codeStepChips }: Plan, threshold: number): Answers => ({
  "plan.coherent": `${coherentMs} ms`,
  "plan.sums": String(sums),
  "plan.bin": `${dopplerBinHz} Hz`,
  "plan.step": `${codeStepChips} chip`,
  "plan.threshold": threshold.toFixed(1),
});

/** To one tenth, up: down would let more false alarms pass. */
export const roundedUp = (threshold: number): number => Math.ceil(threshold * 10) / 10;
