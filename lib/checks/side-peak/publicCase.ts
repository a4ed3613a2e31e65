import { askedQuantities } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import type { CaseFile, CheckPlan, FormSection, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import { STEP_CHIPS, type SidePeakTruth } from "./drawCase";
import type { SidePeakParameters } from "./parameters";
import { PEAK_CHOICES, sidePeakCautions, sidePeakQuantities } from "./quantities";

/** Field by field. The form is the same whichever peak is tracked. */
export function publicCase(
  { trackedLagChips, bandwidthHz, averagedMs, fromChips, trace }: SidePeakTruth,
  plan: CheckPlan<SidePeakParameters>,
): PublicCase {
  const asked = askedQuantities(sidePeakQuantities, plan);
  return {
    kind: "side-peak",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Signal", value: "GPS L1C data component, BOC(1,1)" },
      { label: "Chip", value: "1/1.023\u00a0µs, 293.05\u00a0m" },
      { label: "Tracked lag", value: formatQuantity(trackedLagChips, "chip", 3) },
      { label: "Bandwidth of the receiver", value: `${formatQuantity(bandwidthHz / 1e6, "MHz", 1)}, two-sided` },
      { label: "Averaged over", value: `${formatQuantity(averagedMs, "ms", 0)}, data taken off` },
      { label: "Points", value: `${trace.length}, ${formatQuantity(STEP_CHIPS, "chip", 3)} apart` },
    ],
    cautions: [...sidePeakCautions],
    sections: SECTIONS.map((section) => ({
      ...section,
      fields: section.fields.filter(({ quantity }) => asked.has(quantity)),
    })).filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked),
    data: { trackedLagChips, fromChips: threeFigures(fromChips), stepChips: STEP_CHIPS, trace, traceFile: TRACE_FILE },
  };
}

const TRACE_FILE = "trace.csv";

/** A lag as it is printed: binary fractions add up to 812.6750000000001. */
export const threeFigures = (chips: number): number => Math.round(chips * 1000) / 1000;

/** The same numbers as the plot, for a spreadsheet. */
export function traceFile({ fromChips, trace }: SidePeakTruth): CaseFile {
  const lines = trace.map((value, n) => `${(fromChips + n * STEP_CHIPS).toFixed(3)},${value.toFixed(3)}`);
  const text = ["lag_chips,magnitude", ...lines, ""].join("\r\n");
  return { name: TRACE_FILE, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}

const BRIEF = [
  "The trace is the magnitude |R| of a correlator against the lag of its replica, round the lag at which the receiver tracks the satellite. Say which peak it tracks, and measure what the error is worth.",
  "The main peak is the highest of the trace. Its side peaks are the highest points 0.3 to 0.8 chip before and behind it. The receiver's filter rounds all of them, and one reflection off something near may be in the trace and make them unequal: read them from the trace.",
  "Range bias is a lag less the lag of the main peak, in metres: positive where the range comes out too long. For the lock it is that of the tracked lag, near zero on the main peak; for a side peak it is the bias of a loop that rests on it.",
  "A level under the main peak is 20 log of the main peak's magnitude over the other's. Fill in every field, whichever peak is tracked.",
];

const SECTIONS: readonly FormSection[] = [
  {
    id: "lock",
    title: "The lock",
    fields: [
      { id: "peak", label: "What does the loop track?", input: "choice", choices: PEAK_CHOICES, quantity: "peak" },
      { id: "lag", label: "Lag of the main peak", input: "number", unit: "chip", quantity: "lag" },
      {
        id: "bias",
        label: "Range bias of the lock",
        input: "number",
        unit: "m",
        help: "With its sign: plus for a range too long.",
        quantity: "bias",
      },
    ],
  },
  {
    id: "earlier",
    title: "Side peak before the main peak",
    fields: [
      {
        id: "bias",
        label: "Range bias on it",
        input: "number",
        unit: "m",
        help: "With its sign.",
        quantity: "sideBias",
      },
      { id: "level", label: "Level under the main peak", input: "number", unit: "dB", quantity: "sideLevel" },
    ],
  },
  {
    id: "later",
    title: "Side peak behind the main peak",
    fields: [
      {
        id: "bias",
        label: "Range bias on it",
        input: "number",
        unit: "m",
        help: "With its sign.",
        quantity: "sideBias",
      },
      { id: "level", label: "Level under the main peak", input: "number", unit: "dB", quantity: "sideLevel" },
    ],
  },
];
