import { askedQuantities } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { SearchPlanTruth } from "./drawCase";
import type { SearchPlanParameters } from "./parameters";
import { searchPlanCautions, searchPlanQuantities } from "./quantities";

/** Field by field: the requirement, and nothing of the plans that meet it. */
export function publicCase(
  { requirement, timeLimitS }: SearchPlanTruth,
  plan: CheckPlan<SearchPlanParameters>,
): PublicCase {
  const asked = askedQuantities(searchPlanQuantities, plan);
  const { cn0DbHz, windowHz, detection, falseAlarmPerSearch, correlators } = requirement;
  const detectionText = formatUnderstood(percent(detection), "%");
  const falseAlarmText = formatUnderstood(falseAlarmPerSearch, "1");
  const timeText = formatUnderstood(timeLimitS, "s");
  return {
    kind: "search-plan",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Signal", value: "GPS L1 C/A, 1\u2009023 chips in 1\u00a0ms" },
      { label: "Weakest satellite", value: formatUnderstood(cn0DbHz, "dB-Hz") },
      { label: "Doppler window", value: `±${formatQuantity(windowHz, "Hz", 0)}` },
      { label: "Detection probability", value: `at least ${detectionText}` },
      { label: "False alarms per search", value: `at most ${falseAlarmText}` },
      { label: "Time for one satellite", value: `at most ${timeText}` },
      { label: "Correlators", value: `${formatNumber(correlators, 0)}, one cell each at a time` },
      { label: "Data bits", value: "50 a second, edges unknown" },
    ],
    cautions: [...searchPlanCautions],
    sections: [
      { id: "plan", title: "Your plan", fields: PLAN_FIELDS },
      {
        id: "estimate",
        title: "What you expect of it",
        fields: ESTIMATE_FIELDS.filter(({ quantity }) => asked.has(quantity)),
      },
    ].filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      detection: ({ tolerance }) => `at least ${detectionText} less ${formatUnderstood(tolerance, "%")}`,
      falseAlarm: ({ tolerance }) =>
        `at most ${falseAlarmText}, and ${formatUnderstood(tolerance, "%")} of it for rounding`,
      time: () => `at most ${timeText}`,
      ownDetection: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")} of what your plan attains`,
      ownFalseAlarm: ({ tolerance }) => `within a factor of ${formatUnderstood(tolerance, "1")}`,
      ownTime: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")} of the time`,
    }),
    data: {
      cn0DbHz,
      windowHz,
      detectionPercent: percent(detection),
      falseAlarmPerSearch,
      timeLimitS,
      correlators,
    },
  };
}

/** 0.97 times 100 is not 97 in binary fractions. */
export const percent = (probability: number): number => Number((probability * 100).toPrecision(12));

const BRIEF = [
  "Plan the search for the weakest satellite. The server computes what your own plan attains and sets that against the requirement; there is no single right plan.",
  "Cells: (2 × window / bin, rounded up for each half, + 1) times 1 023 / code step. Time: cells times coherent time times number of sums, over the number of correlators.",
  "A cell adds up the powers I² + Q² of its coherent sums. The threshold is on that sum, in units of σ², the noise power of I or Q alone in one coherent sum.",
  "Detection counts a satellite that lies anywhere in its bin and code step, and data bits whose edges nobody knows.",
];

const PLAN_FIELDS: readonly FieldSpec[] = [
  { id: "coherent", label: "Coherent time", input: "number", unit: "ms", quantity: "detection" },
  { id: "sums", label: "Number of sums", input: "number", unit: "1", quantity: "detection" },
  { id: "bin", label: "Doppler bin", input: "number", unit: "Hz", quantity: "detection" },
  { id: "step", label: "Code step", input: "number", unit: "chip", quantity: "detection" },
  { id: "threshold", label: "Threshold", input: "number", unit: "sigma2", quantity: "falseAlarm" },
];

const ESTIMATE_FIELDS: readonly FieldSpec[] = [
  { id: "detection", label: "Expected detection", input: "number", unit: "%", quantity: "ownDetection" },
  {
    id: "falseAlarm",
    label: "Expected false alarms per search",
    input: "number",
    unit: "1",
    quantity: "ownFalseAlarm",
  },
  { id: "time", label: "Expected time", input: "number", unit: "s", quantity: "ownTime" },
];
