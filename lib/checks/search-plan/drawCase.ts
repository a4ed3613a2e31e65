import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { SearchPlanParameters } from "./parameters";
import { planGrid, type Requirement } from "./planGrid";
import { fastestPlan, plansWithin, type ReferencePlan } from "./reference-plans";

export type SearchPlanTruth = {
  requirement: Requirement;
  timeLimitS: number;
  /** The fastest plan of the server's grid that meets the requirement. */
  reference: ReferencePlan;
  gridPlans: number;
  passingPlans: number;
};

export type DrawnCase = { truth: SearchPlanTruth; draws: number };

const CORRELATORS = [512, 1024, 2046, 4092, 8184] as const;
const LEAST_PASSING = 3;
const MOST_PASSING_SHARE = 0.6;
export const DETECTION_ALLOWANCE = 0.01; // of the quantity's default: one point

/** Draws a requirement that neither hardly any plan nor nearly every plan of the grid meets. */
export function drawCase(seedHex: string, parameters: SearchPlanParameters): DrawnCase {
  for (let draws = 1; draws <= 100; draws++) {
    const random = seededRandom(seedHex, `search-plan@1/draw-${draws}`);
    const requirement = drawRequirement(parameters, random);
    const factor = between(random, ...parameters.timeFactor);
    const reference = fastestPlan(requirement);
    if (!reference) continue;
    const timeLimitS = twoFigures(reference.timeS * factor);
    const gridPlans = planGrid(requirement).length;
    const passingPlans = plansWithin(requirement, requirement.detection - DETECTION_ALLOWANCE, timeLimitS).length;
    if (passingPlans < LEAST_PASSING || passingPlans > MOST_PASSING_SHARE * gridPlans) continue;
    return { truth: { requirement, timeLimitS, reference, gridPlans, passingPlans }, draws };
  }
  throw new Error("search-plan: no fair requirement in 100 draws");
}

function drawRequirement(parameters: SearchPlanParameters, random: Random): Requirement {
  return {
    cn0DbHz: inSteps(random, parameters.cn0, 0.5),
    windowHz: inSteps(random, parameters.window, 500),
    detection: inSteps(random, parameters.detection, 1) / 100,
    falseAlarmPerSearch: drawFalseAlarm(random, parameters.falseAlarm),
    correlators: random.pick(CORRELATORS),
  };
}

const inSteps = (random: Random, [from, to]: readonly [number, number], step: number): number =>
  Math.min(
    to,
    Math.max(
      from,
      random.integer(Math.ceil(from / step), Math.max(Math.ceil(from / step), Math.floor(to / step))) * step,
    ),
  );

const FALSE_ALARMS = [1e-5, 2e-5, 5e-5, 1e-4, 2e-4, 5e-4, 1e-3, 2e-3, 5e-3, 1e-2, 2e-2, 5e-2, 1e-1] as const;

function drawFalseAlarm(random: Random, [from, to]: readonly [number, number]): number {
  const inRange = FALSE_ALARMS.filter((value) => value >= from && value <= to);
  return inRange.length > 0 ? random.pick(inRange) : from;
}

/** Limits are written as people write them; rounded up, so that the factor is kept. */
function twoFigures(value: number): number {
  let unit = 1;
  while (unit * 100 <= value) unit *= 10;
  while (unit * 10 > value) unit /= 10;
  return Number((Math.ceil(value / unit) * unit).toPrecision(2));
}
