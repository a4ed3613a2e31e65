import type { CautionTopic, QuantityDefinition } from "../kind";

export const DETECTION_CHOICES = [
  { value: "yes", label: "A signal is detected" },
  { value: "no", label: "Nothing above the threshold" },
] as const;

export const correlatorReadingQuantities: readonly QuantityDefinition[] = [
  {
    id: "detection",
    label: "Detection",
    unit: null,
    choices: DETECTION_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "A signal claimed in noise, or noise claimed where a signal is, sends the whole diagnosis the wrong way.",
  },
  {
    id: "lag",
    label: "Lag of the highest cell",
    unit: "chip",
    tolerance: { value: 0.2, unit: "chip" },
    toleranceRange: { from: 0.15, to: 0.5, unit: "chip" },
    critical: false,
    reason: "Cells are 0.125 chip apart, and noise moves the top of the peak.",
  },
  {
    id: "lagTime",
    label: "The same lag in time",
    unit: "us",
    tolerance: { value: 1, unit: "%" },
    toleranceRange: { from: 0.2, to: 5, unit: "%" },
    critical: false,
    reason: "A conversion, judged from your own lag in chip.",
  },
  {
    id: "lagLength",
    label: "The same lag in length",
    unit: "m",
    tolerance: { value: 1, unit: "%" },
    toleranceRange: { from: 0.2, to: 5, unit: "%" },
    critical: false,
    reason: "A conversion, judged from your own lag in chip.",
  },
  {
    id: "peakRatio",
    label: "Peak over second peak",
    unit: "dB",
    tolerance: { value: 1, unit: "dB" },
    toleranceRange: { from: 0.3, to: 2, unit: "dB" },
    critical: false,
    reason: "Two readings of a trace, each good to a few hundredths.",
  },
  {
    id: "noiseMean",
    label: "Noise mean",
    unit: "1",
    tolerance: { value: 4, unit: "%" },
    toleranceRange: { from: 1, to: 10, unit: "%" },
    critical: false,
    reason: "The mean of some 8 000 cells; the median of the same cells is 6 % lower.",
  },
  {
    id: "threshold",
    label: "Threshold",
    unit: "1",
    tolerance: { value: 2, unit: "%" },
    toleranceRange: { from: 0.5, to: 10, unit: "%" },
    critical: false,
    reason: "A formula, judged from your own noise mean.",
  },
];

export const correlatorReadingCautions: readonly CautionTopic[] = ["life"];
