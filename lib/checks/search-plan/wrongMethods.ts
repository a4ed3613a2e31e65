import { thresholdSigma2 } from "@/lib/gnss/detection";
import type { Answers, BuiltCase, WrongMethod } from "../kind";
import type { SearchPlanTruth } from "./drawCase";
import type { SearchPlanParameters } from "./parameters";
import { losslessDetection, thresholdFor, timeOf, type Plan, type Rated } from "./planGrid";
import { answersFor, requirementOf, roundedUp, solve } from "./solve";

type Wrong = WrongMethod<SearchPlanParameters, SearchPlanTruth>;

/** Typical wrong plans; each is made with care but for the named step. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "bin-not-shrunk": {
    label: "Bins of 500 Hz kept while the coherent time grows to 10 ms",
    misses: ["detection", "ownDetection"],
    solve: (built) => planWithoutLosses(built, { coherentMs: 10, dopplerBinHz: 500, codeStepChips: 0.5 }),
  },
  "per-cell": {
    label: "False-alarm probability of a search taken for that of a cell",
    misses: ["falseAlarm", "ownFalseAlarm"],
    solve({ publicCase }) {
      const { falseAlarmPerSearch } = requirementOf(publicCase);
      const right = solve(publicCase);
      const threshold = thresholdSigma2(falseAlarmPerSearch, Number(right["plan.sums"]));
      return { ...right, "plan.threshold": threshold.toFixed(1) };
    },
  },
  "bit-edges-ignored": {
    label: "Coherent sums of 20 ms as if the bit edges were known",
    misses: ["detection", "ownDetection"],
    solve: (built) => planWithoutLosses(built, { coherentMs: 20, dopplerBinHz: 33, codeStepChips: 0.5 }),
  },
  "no-mid-bin-loss": {
    label: "Losses between bins and code steps left out",
    misses: ["detection", "ownDetection"],
    solve: (built) => planWithoutLosses(built, { coherentMs: 4, dopplerBinHz: 250, codeStepChips: 1 }),
  },
};

/** The fewest sums that would do if every satellite stood in the middle of its cell and had no data bits. */
function planWithoutLosses({ publicCase }: BuiltCase<SearchPlanTruth>, given: Omit<Plan, "sums">): Answers {
  const requirement = requirementOf(publicCase);
  let sums = 1;
  while (sums < 500 && losslessDetection({ ...given, sums }, requirement) < requirement.detection) sums++;
  const plan: Rated = { ...given, sums, timeS: timeOf({ ...given, sums }, requirement) };
  const threshold = roundedUp(thresholdFor(plan, requirement));
  return answersFor(plan, requirement, threshold, losslessDetection(plan, requirement, threshold));
}
