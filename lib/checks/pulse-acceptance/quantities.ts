import type { CautionTopic, QuantityDefinition, ToleranceValue } from "../kind";

/** Least tolerance of a time error in ns: the counter's own resolution and the rounding of a sheet. */
export const LEAST_NS = 0.5;

export const VERDICT_CHOICES = [
  { value: "accept", label: "Keeps the limit" },
  { value: "refuse", label: "Does not keep the limit" },
] as const;

export const STEP_CHOICES = [
  { value: "yes", label: "There is a step" },
  { value: "no", label: "No step" },
] as const;

const TWO_PER_CENT = {
  tolerance: { value: 2, unit: "%" } as ToleranceValue,
  toleranceRange: { from: 0.5, to: 10, unit: "%" },
  critical: false,
} as const;

export const pulseAcceptanceQuantities: readonly QuantityDefinition[] = [
  { id: "mean", label: "Mean time error", unit: "ns", ...TWO_PER_CENT, reason: "A mean of some 2 880 readings." },
  {
    id: "maxTe",
    label: "max|TE|",
    unit: "ns",
    ...TWO_PER_CENT,
    reason: "One reading of the log; the mean stays in it. A missed trigger or the wrong cables move it by far more.",
  },
  {
    id: "mtieShort",
    label: "MTIE, short interval",
    unit: "ns",
    ...TWO_PER_CENT,
    reason: "The difference of two readings of the log.",
  },
  {
    id: "mtieLong",
    label: "MTIE, long interval",
    unit: "ns",
    ...TWO_PER_CENT,
    reason: "The difference of two readings of the log.",
  },
  {
    id: "step",
    label: "Step and its time",
    unit: "min",
    choices: STEP_CHOICES,
    tolerance: { value: 5, unit: "min" },
    toleranceRange: { from: 1, to: 30, unit: "min" },
    critical: false,
    reason: "Readings are 30 s apart; in the sawtooth a step is seen to a few of them.",
  },
  {
    id: "verdict",
    label: "Verdict",
    unit: null,
    choices: VERDICT_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "A clock accepted above its limit brings a network out of step; one refused below it is a day's work lost.",
  },
];

export const pulseAcceptanceCautions: readonly CautionTopic[] = ["life"];
