import type { CautionTopic, QuantityDefinition } from "../kind";

export const PEAK_CHOICES = [
  { value: "main", label: "Main peak" },
  { value: "side", label: "Side peak" },
  { value: "reflection", label: "Reflection" },
] as const;

export const sidePeakQuantities: readonly QuantityDefinition[] = [
  {
    id: "peak",
    label: "Tracked peak",
    unit: null,
    choices: PEAK_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason:
      "A side peak believed leaves a constant range error that no averaging takes out; a good lock called false loses a satellite.",
  },
  {
    id: "lag",
    label: "Lag of the main peak",
    unit: "chip",
    tolerance: { value: 0.02, unit: "chip" },
    toleranceRange: { from: 0.01, to: 0.05, unit: "chip" },
    critical: false,
    reason: "Points are 0.005 chip apart, and noise moves the top by one or two of them.",
  },
  {
    id: "bias",
    label: "Range bias of the lock",
    unit: "m",
    tolerance: { value: 5, unit: "m" },
    toleranceRange: { from: 3, to: 15, unit: "m" },
    critical: false,
    reason:
      "Size and sign, judged from your own lag of the main peak; the wrong sign doubles the error when it is taken out.",
  },
  {
    id: "sideBias",
    label: "Range bias on a side peak",
    unit: "m",
    tolerance: { value: 5, unit: "m" },
    toleranceRange: { from: 3, to: 15, unit: "m" },
    critical: false,
    reason: "Read from the trace, judged from your own lag of the main peak; points are 1.5 m apart.",
  },
  {
    id: "sideLevel",
    label: "Side peak under the main peak",
    unit: "dB",
    tolerance: { value: 0.7, unit: "dB" },
    toleranceRange: { from: 0.5, to: 1.5, unit: "dB" },
    critical: false,
    reason: "Noise moves a level read from the trace by two or three tenths.",
  },
];

export const sidePeakCautions: readonly CautionTopic[] = ["life"];
