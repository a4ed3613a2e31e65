import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { formatNumber, formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CaseFile, CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { PulseAcceptanceTruth } from "./drawCase";
import type { PulseAcceptanceParameters } from "./parameters";
import {
  LEAST_NS,
  pulseAcceptanceCautions,
  pulseAcceptanceQuantities,
  STEP_CHOICES,
  VERDICT_CHOICES,
} from "./quantities";

/** Field by field: the readings as the counter gave them, and what it takes to make time errors of them. */
export function publicCase(
  { clock, limitNs, startCableNs, stopCableNs, intervals, intervalS, readingsNs }: PulseAcceptanceTruth,
  plan: CheckPlan<PulseAcceptanceParameters>,
): PublicCase {
  const asked = askedQuantities(pulseAcceptanceQuantities, plan);
  const sections = [
    { id: "log", title: "Time error", fields: logFields(intervals) },
    { id: "step", title: "Step", fields: STEP_FIELDS },
    { id: "verdict", title: "Verdict", fields: VERDICT_FIELDS },
  ];
  return {
    kind: "pulse-acceptance",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Log", value: `24\u00a0h, one reading every ${formatUnderstood(intervalS, "s")}` },
      { label: "Readings", value: formatNumber(readingsNs.length, 0) },
      { label: "Lead from the reference, starts the counter", value: formatQuantity(startCableNs, "ns", 1) },
      { label: "Lead from the receiver, stops the counter", value: formatQuantity(stopCableNs, "ns", 1) },
      { label: "Limit", value: `max|TE| not above ${formatUnderstood(limitNs, "ns")}, ${clock}` },
      { label: "MTIE, short interval", value: formatUnderstood(intervals.shortS, "s") },
      { label: "MTIE, long interval", value: formatUnderstood(intervals.longS, "s") },
    ],
    cautions: [...pulseAcceptanceCautions],
    sections: sections
      .map((section) => ({ ...section, fields: section.fields.filter(({ quantity }) => asked.has(quantity)) }))
      .filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      mean: relative,
      maxTe: relative,
      mtieShort: relative,
      mtieLong: relative,
      step: ({ tolerance }) => `same; time ±${formatUnderstood(tolerance, "min")}`,
    }),
    data: {
      clock,
      limitNs,
      startCableNs,
      stopCableNs,
      mtieShortS: intervals.shortS,
      mtieLongS: intervals.longS,
      intervalS,
      readingsNs,
      logFile: LOG_FILE,
    },
  };
}

const relative = ({ tolerance }: AskedQuantity) =>
  `±${formatUnderstood(tolerance, "%")}, at least ±${formatUnderstood(LEAST_NS, "ns")}`;

export const LOG_FILE = "readings.csv";

/** The readings as numbers, for a spreadsheet or the bench. */
export function logFile({ readingsNs, intervalS }: PulseAcceptanceTruth): CaseFile {
  const lines = readingsNs.map((reading, n) => `${n * intervalS},${reading.toFixed(1)}`);
  const text = ["time_s,reading_ns", ...lines, ""].join("\r\n");
  return { name: LOG_FILE, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}

const BRIEF = [
  "A receiver's 1PPS was logged for 24 h against a reference pulse. Judge the log as for an acceptance sheet.",
  "The counter is started by the reference pulse and stopped by the receiver's, each through a lead of its own; a reading is positive when it stops later than it starts. The time error is that of the receiver's pulse at its socket against the reference at its own, so the leads have to be taken off.",
  "A single reading far from all others around it is a missed trigger: leave it out of everything. All other readings count, and the mean stays in max|TE|.",
  "A step is a change of 8 ns or more from one reading to the next that lasts for hours; there is one or none. MTIE is the largest peak to peak of the time error inside any window of the interval, its ends included.",
];

const logFields = ({ shortS, longS }: PulseAcceptanceTruth["intervals"]): readonly FieldSpec[] => [
  { id: "mean", label: "Mean time error, with its sign", input: "number", unit: "ns", signed: true, quantity: "mean" },
  { id: "maxTe", label: "max|TE|", input: "number", unit: "ns", quantity: "maxTe" },
  {
    id: "mtieShort",
    label: `MTIE over ${formatUnderstood(shortS, "s")}`,
    input: "number",
    unit: "ns",
    quantity: "mtieShort",
  },
  {
    id: "mtieLong",
    label: `MTIE over ${formatUnderstood(longS, "s")}`,
    input: "number",
    unit: "ns",
    quantity: "mtieLong",
  },
];

const STEP_FIELDS: readonly FieldSpec[] = [
  { id: "seen", label: "Is there a step?", input: "choice", choices: STEP_CHOICES, quantity: "step" },
  {
    id: "time",
    label: "Time of the step from the beginning",
    input: "number",
    unit: "min",
    help: "Leave it empty where there is none.",
    quantity: "step",
  },
];

const VERDICT_FIELDS: readonly FieldSpec[] = [
  { id: "kept", label: "Against the limit", input: "choice", choices: VERDICT_CHOICES, quantity: "verdict" },
];
