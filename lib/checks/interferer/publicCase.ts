import { askedQuantities } from "../askedQuantities";
import { CAPTURE_FILE } from "../captureFiles";
import { formatNumber } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { CheckPlan, FieldSpec, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import { CLASS_CHOICES } from "./classes";
import type { InterfererTruth } from "./drawCase";
import { RATE_HZ } from "./drawScene";
import type { InterfererParameters } from "./parameters";
import { interfererCautions, interfererQuantities } from "./quantities";

/** Field by field; the form is the same whatever is there, or nothing. */
export function publicCase({ durationMs }: InterfererTruth, plan: CheckPlan<InterfererParameters>): PublicCase {
  const asked = askedQuantities(interfererQuantities, plan);
  const own = (fields: readonly FieldSpec[]) => fields.filter(({ quantity }) => asked.has(quantity));
  return {
    kind: "interferer",
    version: 1,
    title: plan.title,
    brief: BRIEF,
    given: [
      { label: "Centre", value: "1\u2009575.42\u00a0MHz" },
      { label: "Sample rate", value: formatUnderstood(RATE_HZ / 1e6, "MHz") },
      { label: "Samples", value: "8-bit signed, I then Q" },
      { label: "Length", value: formatUnderstood(durationMs, "ms") },
      { label: "Full scale", value: `a magnitude of ${formatNumber(127, 0)} counts: 0\u00a0dB` },
      { label: "Own line", value: "at 0\u00a0Hz" },
      { label: "Mirrored frequencies", value: "26 to 34\u00a0dB weaker, from unequal I and Q" },
    ],
    cautions: [...interfererCautions],
    sections: [
      { id: "interference", title: "The interference", fields: own(INTERFERENCE_FIELDS) },
      { id: "receiver", title: "The receiver itself", fields: own(RECEIVER_FIELDS) },
    ].filter(({ fields }) => fields.length > 0),
    tolerances: publicTolerances(asked, {
      centre: ({ tolerance }) => `±${formatUnderstood(tolerance, "kHz")}, or 2\u00a0% of offset or bandwidth`,
      bandwidth: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}; a single carrier up to 10\u00a0kHz`,
      period: ({ tolerance }) => `±${formatUnderstood(tolerance, "%")}; 0 where nothing repeats`,
    }),
    data: { captureFile: CAPTURE_FILE, rateHz: RATE_HZ, samples: (RATE_HZ / 1000) * durationMs },
  };
}

const BRIEF = [
  "The capture may hold one interference, or the receiver's own noise alone. Say what it is and measure it. Satellites are far under the noise. Fill in every field; with nothing there the interference has 0 in each.",
  "The receiver has a line of its own at 0 Hz, from its mixer, and shows everything once more, weaker, at the mirrored frequency. Neither is interference. Its amplifier is not overloaded.",
  "Centre is the middle of the interference, from 1 575.42 MHz. Bandwidth is taken where the averaged spectrum is 6 dB under its top, lowest to highest frequency.",
  "Repetition is the time of one sweep, from pulse to pulse, of one swing of a modulation, or of one code.",
  "Level is the mean power of the interference over the whole capture, over the noise power in 1 MHz. The own line's level likewise. The noise floor is the noise power in 1 MHz against full scale.",
];

const INTERFERENCE_FIELDS: readonly FieldSpec[] = [
  { id: "class", label: "What it is", input: "choice", choices: CLASS_CHOICES, quantity: "class" },
  {
    id: "centre",
    label: "Centre",
    input: "number",
    unit: "kHz",
    signed: true,
    help: "Below the middle with a minus.",
    quantity: "centre",
  },
  {
    id: "bandwidth",
    label: "Bandwidth at 6 dB",
    input: "number",
    unit: "kHz",
    help: "0 for a single carrier.",
    quantity: "bandwidth",
  },
  {
    id: "period",
    label: "Repetition",
    input: "number",
    unit: "us",
    help: "0 where nothing repeats.",
    quantity: "period",
  },
  { id: "level", label: "Level over the floor in 1 MHz", input: "number", unit: "dB", quantity: "level" },
];

const RECEIVER_FIELDS: readonly FieldSpec[] = [
  {
    id: "floor",
    label: "Noise floor in 1 MHz",
    input: "number",
    unit: "dB",
    signed: true,
    help: "Against full scale, so below 0.",
    quantity: "floor",
  },
  {
    id: "ownLine",
    label: "Own line over the floor in 1 MHz",
    input: "number",
    unit: "dB",
    signed: true,
    quantity: "ownLine",
  },
];
