import { askedQuantities } from "../askedQuantities";
import { formatNumber } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CaseFile, CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import type { CorrelatorReadingTruth } from "./drawCase";
import type { CorrelatorReadingParameters } from "./parameters";
import { correlatorReadingCautions, correlatorReadingQuantities, DETECTION_CHOICES } from "./quantities";
import { STEP_CHIPS } from "./readTrace";

/** Field by field. The form is the same whether the trace holds a signal or not. */
export function publicCase(
  { prn, coherentMs, falseAlarmPerCell, trace }: CorrelatorReadingTruth,
  plan: CheckPlan<CorrelatorReadingParameters>,
): PublicCase {
  const asked = askedQuantities(correlatorReadingQuantities, plan);
  return {
    kind: "correlator-reading",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Signal", value: "GPS L1 C/A" },
      { label: "PRN", value: String(prn) },
      { label: "Coherent time", value: `${coherentMs}\u00a0ms` },
      { label: "Cells", value: `${formatNumber(trace.length, 0)}, ${formatUnderstood(STEP_CHIPS, "chip")} apart` },
      { label: "False-alarm probability of one cell", value: formatUnderstood(falseAlarmPerCell, "1") },
    ],
    cautions: [...correlatorReadingCautions],
    sections: [{ id: "reading", title: "Reading", fields: FIELDS.filter(({ quantity }) => asked.has(quantity)) }],
    tolerances: publicTolerances(asked, {
      lagTime: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}, at least ±0.01\u00a0µs`,
      lagLength: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}, at least ±3\u00a0m`,
      noiseMean: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}`,
      threshold: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}`,
    }),
    data: { prn, stepChips: STEP_CHIPS, coherentMs, falseAlarmPerCell, trace, traceFile: TRACE_FILE },
  };
}

const TRACE_FILE = "trace.csv";

/** The same numbers as the plot, for a spreadsheet. */
export function traceFile({ trace }: CorrelatorReadingTruth): CaseFile {
  const lines = trace.map((value, cell) => `${(cell * STEP_CHIPS).toFixed(3)},${value.toFixed(4)}`);
  const text = ["lag_chips,magnitude", ...lines, ""].join("\r\n");
  return { name: TRACE_FILE, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}

const BRIEF = [
  "The trace is the magnitude |R| of one correlator against lag, over one whole code. The lag is the delay of the replica; where a signal is there, its lag is the delay of its code, from 0 to 1 023 chip.",
  "The trace may hold a signal or noise alone. Fill in every field in both cases.",
  "Noise and second peak are read from the cells more than 1 chip away from the highest cell, going round the end of the code. Noise mean is the mean of |R| over these cells.",
  "The threshold is the level that one cell of noise alone exceeds with the false-alarm probability given. |R| of noise alone follows a Rayleigh law. Detect when the highest cell is above your threshold.",
];

const FIELDS: readonly FieldSpec[] = [
  {
    id: "detection",
    label: "Is a signal detected?",
    input: "choice",
    choices: DETECTION_CHOICES,
    quantity: "detection",
  },
  { id: "lag", label: "Lag of the highest cell", input: "number", unit: "chip", quantity: "lag" },
  { id: "lagTime", label: "The same lag in time", input: "number", unit: "us", quantity: "lagTime" },
  { id: "lagLength", label: "The same lag in length", input: "number", unit: "m", quantity: "lagLength" },
  {
    id: "peakRatio",
    label: "Highest cell over second peak",
    input: "number",
    unit: "dB",
    help: "Of magnitudes: 20 log of their ratio.",
    quantity: "peakRatio",
  },
  { id: "noiseMean", label: "Noise mean", input: "number", unit: "1", quantity: "noiseMean" },
  { id: "threshold", label: "Threshold", input: "number", unit: "1", quantity: "threshold" },
];
