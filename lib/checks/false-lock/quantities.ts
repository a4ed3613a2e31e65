import type { CautionTopic, QuantityDefinition } from "../kind";

export const falseLockCautions: readonly CautionTopic[] = ["transmit", "life"];

export type Verdict = "genuine" | "cross-correlation" | "absent";

export const VERDICT_CHOICES = [
  { value: "genuine", label: "Genuine" },
  { value: "cross-correlation", label: "Cross-correlation" },
  { value: "absent", label: "Absent" },
] as const;

/** What shows that a lock is on another satellite's code. */
export const RIGHT_TESTS: readonly string[] = ["doppler-modulo", "many-lags", "data-bits", "power-follows", "mask"];
const TEST_CHOICES = [
  { value: "highest-peak", label: "Its peak is the highest of its grid" },
  { value: "doppler-modulo", label: "Its Doppler is another satellite's, plus or minus whole kHz" },
  { value: "threshold", label: "It disappears when the threshold is raised" },
  { value: "many-lags", label: "Many peaks of nearly the same height, at many lags" },
  { value: "data-bits", label: "Its data bits are another satellite's" },
  { value: "second-path", label: "A second peak stands within one chip of the first" },
  { value: "power-follows", label: "Its level follows another satellite's level" },
  { value: "mask", label: "The sky plot shows it behind the wall" },
] as const;

export const RIGHT_REMEDIES: readonly string[] = ["compare", "subtract"];
const REMEDY_CHOICES = [
  { value: "raise", label: "Raise the detection threshold for all satellites" },
  { value: "compare", label: "Drop the lock; compare every weak lock with the strong satellites before it is used" },
  { value: "antenna", label: "Fit an antenna that rejects reflections better" },
  { value: "longer", label: "Add up for longer, so that it stands out better" },
  { value: "subtract", label: "Drop the lock; subtract the strong satellite's signal and search again" },
  { value: "weight", label: "Keep the satellite with less weight" },
] as const;

export const falseLockQuantities: readonly QuantityDefinition[] = [
  {
    id: "verdict",
    label: "Verdict",
    unit: null,
    choices: VERDICT_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "A false satellite accepted puts kilometres into a range; a genuine one refused costs a fix.",
  },
  {
    id: "parent",
    label: "Satellite behind the false lock",
    unit: null,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "Only one satellite is strong enough.",
  },
  {
    id: "falseDoppler",
    label: "Doppler of the false peak",
    unit: "Hz",
    tolerance: { value: 50, unit: "Hz" },
    toleranceRange: { from: 40, to: 250, unit: "Hz" },
    critical: false,
    reason: "Half of a bin of 100 Hz, which is one over the coherent time.",
  },
  {
    id: "falseCn0",
    label: "Apparent C/N0 of the false peak",
    unit: "dB-Hz",
    tolerance: { value: 1.5, unit: "dB-Hz" },
    toleranceRange: { from: 1.2, to: 3, unit: "dB-Hz" },
    critical: false,
    reason: "Noise and the other satellites move a peak as low as this.",
  },
  {
    id: "test",
    label: "Test that shows it",
    unit: null,
    choices: TEST_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "Any test that a genuine weak satellite would pass and a false lock fails.",
  },
  {
    id: "remedy",
    label: "Remedy",
    unit: null,
    choices: REMEDY_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "It has to take the false lock away and leave weak genuine satellites.",
  },
];
