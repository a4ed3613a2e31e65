import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { coherentSnr, detectionProbability, falseAlarmPerCell, thresholdSigma2 } from "@/lib/gnss/detection";
import { planDetection, planPerformance, type PlanPerformance, type SearchPlan } from "@/lib/gnss/searchPlan";
import type { Random } from "@/lib/numeric/random";

/** What a case asks of a plan. */
export type Requirement = {
  cn0DbHz: number;
  /** Half width. */
  windowHz: number;
  detection: number;
  falseAlarmPerSearch: number;
  correlators: number;
};

/** What a plan sets, but for the threshold. */
export type Plan = { coherentMs: number; sums: number; dopplerBinHz: number; codeStepChips: number };

export type Rated = Plan & { timeS: number };

const COHERENT_MS = [1, 2, 4, 5, 8, 10, 20] as const;
const SUMS = [1, 2, 5, 10, 20, 30, 40, 60, 80, 100, 150, 200, 300, 400] as const;
const LONGEST_MS = 400; // beyond it the code Doppler moves a peak out of its cell
const BINS_OVER_RESOLUTION = [1 / 2, 2 / 3, 1] as const; // 2/3: Kaplan & Hegarty, Understanding GPS, 2nd ed., 5.8
const STEPS_CHIPS = [0.5, 1] as const;

/** All plans of the grid, the fastest first. */
export function planGrid(requirement: Requirement): Rated[] {
  const plans = COHERENT_MS.flatMap((coherentMs) =>
    SUMS.filter((sums) => sums * coherentMs <= LONGEST_MS).flatMap((sums) =>
      BINS_OVER_RESOLUTION.flatMap((share) =>
        STEPS_CHIPS.map((codeStepChips) => {
          const plan = { coherentMs, sums, dopplerBinHz: Math.round((share * 1000) / coherentMs), codeStepChips };
          return { ...plan, timeS: timeOf(plan, requirement) };
        }),
      ),
    ),
  );
  return plans.sort((a, b) => a.timeS - b.timeS);
}

export const cellsOf = ({ dopplerBinHz, codeStepChips }: Plan, { windowHz }: Requirement): number =>
  (2 * Math.ceil(windowHz / dopplerBinHz) + 1) * (CA_LENGTH_CHIPS / codeStepChips);

/** Every cell in turn takes all of its coherent sums. */
export const timeOf = (plan: Plan, requirement: Requirement): number =>
  (cellsOf(plan, requirement) * (plan.coherentMs / 1000) * plan.sums) / requirement.correlators;

/** Detection of a satellite in the middle of its bin and cell, without data bits: no plan does better. */
export function losslessDetection(
  plan: Plan,
  requirement: Requirement,
  threshold = thresholdFor(plan, requirement),
): number {
  return detectionProbability(threshold, plan.sums, coherentSnr(requirement.cn0DbHz, plan.coherentMs / 1000));
}

export const thresholdFor = (plan: Plan, requirement: Requirement): number =>
  thresholdSigma2(falseAlarmPerCell(requirement.falseAlarmPerSearch, cellsOf(plan, requirement)), plan.sums);

type Drawn = [plan: Plan, requirement: Requirement, thresholdSigma2: number, draws: number, random: Random];

/** What a plan attains, by draws. */
export const performanceOf = (...drawn: Drawn): PlanPerformance => planPerformance(searchPlanOf(...drawn));

/** Its detection alone, some five times as quickly; within 1e-6. */
export const quickDetection = (...drawn: Drawn): number => planDetection(searchPlanOf(...drawn));

const searchPlanOf = (...[plan, requirement, thresholdInSigma2, draws, random]: Drawn): SearchPlan => ({
  cn0DbHz: requirement.cn0DbHz,
  coherentMs: plan.coherentMs,
  sums: plan.sums,
  dopplerBinHz: plan.dopplerBinHz,
  codeStepChips: plan.codeStepChips,
  windowHz: requirement.windowHz,
  correlators: requirement.correlators,
  bitEdgesKnown: false,
  thresholdSigma2: thresholdInSigma2,
  draws,
  random,
});
