import type { CautionTopic, QuantityDefinition } from "../kind";

/** How C/N0 can be had from prompts; the first two keep to whole data bits and hold where signals are weak. */
export const METHOD_CHOICES = [
  { value: "narrow-wide", label: "Narrow over wide power, sums inside the data bits" },
  { value: "bit-sums", label: "Power of whole-bit sums against the prompts' scatter about them" },
  { value: "moments", label: "Second and fourth moment of the single prompts" },
  { value: "branches", label: "Power in I over power in Q" },
  { value: "decibel-mean", label: "Mean of the single prompts' levels in dB" },
] as const;

export const SOUND_METHODS = ["narrow-wide", "bit-sums"] as const;

export const cn0Quantities: readonly QuantityDefinition[] = [
  {
    id: "cn0",
    label: "C/N0",
    unit: "dB-Hz",
    tolerance: { value: 1, unit: "dB" },
    toleranceRange: { from: 0.6, to: 1, unit: "dB" },
    critical: false,
    reason: "A sound method scatters by 0.1 to 0.2 dB over 2 s; below 33 dB-Hz twice the tolerance is allowed.",
  },
  {
    id: "method",
    label: "Method",
    unit: null,
    choices: METHOD_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "Not every method holds where a single prompt is mostly noise.",
  },
];

export const cn0Cautions: readonly CautionTopic[] = ["life"];
