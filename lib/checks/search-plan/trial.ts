import { exp } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { guessAnswers, type Guess } from "../guessAnswers";
import type { Answers, BuiltCase, Difficulty, PublicCase, Trial } from "../kind";
import { attainQuickly } from "./attain";
import { buildCase } from "./buildCase";
import type { SearchPlanTruth } from "./drawCase";
import { markAnswers } from "./markAnswers";
import type { SearchPlanParameters } from "./parameters";
import { quickDetection } from "./planGrid";
import { plansWithin } from "./reference-plans";
import { answersFor, requirementOf, roundedUp } from "./solve";

/** The release check's own people. */
export const trial: Trial<SearchPlanParameters, SearchPlanTruth> = {
  whole: true,
  build(seedHex, plan) {
    const built = buildCase(seedHex, plan);
    SEED_OF.set(built.truth, seedHex);
    return built;
  },
  judge({ truth }, plan, answers) {
    const seedHex = SEED_OF.get(truth);
    if (!seedHex) throw new RangeError("search-plan: judge takes a case of this trial's own build");
    return markAnswers(seedHex, truth, plan, answers, attainQuickly);
  },
  read: ({ publicCase }, _plan, random) => readBy(publicCase, random),
  guess: (publicCase, _plan, random) => guessAnswers(publicCase.sections, GUESSES, random),
  difficulty,
};

/** The marking draws its satellites from the case's seed, which is no part of a built case. */
const SEED_OF = new WeakMap<SearchPlanTruth, string>();

const BENCH_DRAWS = 2000; // as a planner on the bench has them: half a point of standard error
const TABLE_SPREAD = 0.15; // of a false-alarm probability read off a table or a curve, in logarithms

/** Tries plans that fit the time until one detects enough by own draws; writes down whole per cents and two figures. */
function readBy(publicCase: PublicCase, random: Random): Answers {
  const requirement = requirementOf(publicCase);
  const inTime = plansWithin(requirement, requirement.detection - 0.01, publicCase.data.timeLimitS as number);
  const byOwnDraws = inTime.map((plan) => ({ plan, threshold: roundedUp(plan.thresholdSigma2) }));
  let best = { ...byOwnDraws[0], detection: 0 };
  for (const tried of random.shuffle(byOwnDraws)) {
    const detection = quickDetection(tried.plan, requirement, tried.threshold, BENCH_DRAWS, random);
    if (detection > best.detection) best = { ...tried, detection };
    if (detection >= requirement.detection) break;
  }
  const answers = answersFor(best.plan, requirement, best.threshold, best.detection);
  const falseAlarm = Number(answers["estimate.falseAlarm"]) * exp(TABLE_SPREAD * random.gaussian());
  return {
    ...answers,
    "estimate.falseAlarm": falseAlarm.toPrecision(1),
    "estimate.time": Number(best.plan.timeS.toPrecision(2)).toString(),
  };
}

/** Plans as people set them, estimates as such requirements have them. */
const GUESSES: Readonly<Record<string, Guess>> = {
  "plan.coherent": (random) => random.pick(["1", "2", "4", "5", "10", "20"]),
  "plan.sums": (random) => random.pick(["5", "10", "20", "40", "60", "100"]),
  "plan.bin": [25, 700],
  "plan.step": (random) => random.pick(["0.5", "1"]),
  "plan.threshold": [30, 400],
  "estimate.detection": [88, 100],
  "estimate.falseAlarm": (random) => exp(between(random, -9.2, -4.6)).toPrecision(1), // 1e-4 to 1e-2
  "estimate.time": [1, 60],
};

/** A requirement that hardly any plan meets, or nearly every one, tells nobody apart. */
function difficulty({ truth }: BuiltCase<SearchPlanTruth>): Difficulty[] {
  const { timeLimitS, reference, gridPlans, passingPlans } = truth;
  return [
    { label: "Plans of the grid that meet it", unit: "1", value: passingPlans, from: 3, to: gridPlans },
    { label: "Their share", unit: "%", value: (100 * passingPlans) / gridPlans, from: 0, to: 60 },
    { label: "Time over that of the fastest", unit: "1", value: timeLimitS / reference.timeS, from: 1.2, to: 5.5 },
  ];
}
