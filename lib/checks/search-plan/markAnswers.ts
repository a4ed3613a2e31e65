import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import { attain, type Attained } from "./attain";
import type { SearchPlanTruth } from "./drawCase";
import { figures } from "./figures";
import { markEstimate } from "./markEstimate";
import { markPlan } from "./markPlan";
import type { SearchPlanParameters } from "./parameters";
import { searchPlanQuantities } from "./quantities";
import { readPlan } from "./readPlan";

/** Computes what the handed-in plan attains and sets it against the requirement and against the candidate's own estimates. */
export function markAnswers(
  seedHex: string,
  truth: SearchPlanTruth,
  plan: CheckPlan<SearchPlanParameters>,
  answers: Answers,
  attainBy: typeof attain = attain,
): Marking {
  const asked = askedQuantities(searchPlanQuantities, plan);
  const read = readPlan(answers);
  const attained = read.plan ? attainBy(seedHex, truth, read.plan) : null;
  const mark = (quantity: AskedQuantity): MarkedRow =>
    quantity.id.startsWith("own")
      ? markEstimate(quantity, answers, read, attained)
      : markPlan(truth, quantity, read, attained);
  const rows = [...asked.values()].map(mark);
  return finishMarking({ id: "search-plan", version: 1 }, plan, asked, rows, workingsOf(truth, attained));
}

function workingsOf(
  { reference, gridPlans, passingPlans }: SearchPlanTruth,
  attained: Attained | null,
): Marking["workings"] {
  const { coherentMs, sums, dopplerBinHz, codeStepChips, thresholdSigma2, detection, timeS } = reference;
  const plan = [
    `${formatUnderstood(coherentMs, "ms")} × ${sums}`,
    formatUnderstood(dopplerBinHz, "Hz"),
    formatUnderstood(codeStepChips, "chip"),
    formatQuantity(thresholdSigma2, "sigma2", 1),
  ].join(", ");
  return [
    ...(attained ? attainedWorkings(attained) : []),
    {
      label: "A plan that meets the requirement",
      value: `${plan}: ${formatQuantity(detection * 100, "%", 1)} in ${figures(timeS)}\u00a0s`,
    },
    { label: "Plans tried by the server", value: `${passingPlans} of ${gridPlans} meet the requirement` },
  ];
}

const attainedWorkings = (attained: Attained): Marking["workings"] => [
  { label: "Cells", value: formatNumber(attained.cells, 0) },
  { label: "False alarms per cell", value: figures(attained.falseAlarmPerCell) },
  { label: "False alarms per search", value: figures(attained.falseAlarmPerSearch) },
  { label: "Detection in the middle of a cell, no data bits", value: formatQuantity(attained.lossless * 100, "%", 1) },
  {
    label: "Detection, mean of 5\u2009000 draws",
    value: `${formatQuantity(attained.detection * 100, "%", 1)}, standard error ${formatQuantity(attained.detectionStandardError * 100, "%", 1)}`,
  },
];
