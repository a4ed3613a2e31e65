import type { CautionTopic, QuantityDefinition } from "../kind";

export type Verdict = "jammed" | "deceived" | "blocked" | "faulty";

export const VERDICTS: readonly { value: Verdict; label: string }[] = [
  { value: "jammed", label: "Jammed: another transmitter covers the satellites" },
  { value: "deceived", label: "Deceived: false signals are tracked" },
  { value: "blocked", label: "Blocked: something stands before a part of the sky" },
  { value: "faulty", label: "Faulty: our own antenna, cable or receiver" },
];

/** What an indication is read from; two of one instrument say one thing twice. */
export type Instrument = "C/N0" | "gain control" | "clock and its rate" | "position and its speed";

export const INDICATIONS = [
  { value: "cn0-all-fell", label: "C/N0 of all satellites fell together", instrument: "C/N0" },
  { value: "cn0-alike", label: "C/N0 of all satellites rose to the same level", instrument: "C/N0" },
  { value: "cn0-one-side", label: "C/N0 fell on one side of the sky only", instrument: "C/N0" },
  { value: "cn0-stayed", label: "C/N0 stayed as it was", instrument: "C/N0" },
  { value: "gain-down", label: "Gain control backed off", instrument: "gain control" },
  { value: "gain-up", label: "Gain control opened", instrument: "gain control" },
  { value: "gain-stayed", label: "Gain control stayed as it was", instrument: "gain control" },
  { value: "clock-ran", label: "Clock ran away", instrument: "clock and its rate" },
  { value: "doppler-common", label: "Doppler of all satellites shifted alike", instrument: "clock and its rate" },
  { value: "position-ran", label: "Position moved away steadily", instrument: "position and its speed" },
  { value: "doppler-apart", label: "Dopplers drew apart", instrument: "position and its speed" },
] as const satisfies readonly { value: string; label: string; instrument: Instrument }[];

export type Indication = (typeof INDICATIONS)[number]["value"];

export const jammedOrNotQuantities: readonly QuantityDefinition[] = [
  {
    id: "verdict",
    label: "Verdict",
    unit: null,
    choices: VERDICTS,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "A wrong call leaves a bad clock in service, or sends the wrong people.",
  },
  {
    id: "start",
    label: "Start",
    unit: "s",
    tolerance: { value: 30, unit: "s" },
    toleranceRange: { from: 15, to: 120, unit: "s" },
    critical: false,
    reason: "All that was computed from then on is in doubt. Readings are 5 s apart.",
  },
  {
    id: "gainChange",
    label: "Change of the gain control",
    unit: "dB",
    tolerance: { value: 0.7, unit: "dB" },
    toleranceRange: { from: 0.4, to: 1.5, unit: "dB" },
    critical: false,
    reason: "Its sign tells whether more power came in or less.",
  },
  {
    id: "cn0Change",
    label: "Mean change of C/N0",
    unit: "dB",
    tolerance: { value: 0.7, unit: "dB" },
    toleranceRange: { from: 0.4, to: 1.5, unit: "dB" },
    critical: false,
    reason: "The mean over minutes and satellites is good to a few tenths.",
  },
  {
    id: "indications",
    label: "Two independent indications",
    unit: null,
    choices: INDICATIONS.map(({ value, label }) => ({ value, label })),
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "One instrument may itself be wrong. Two that do not depend on one another are not.",
  },
];

export const jammedOrNotCautions: readonly CautionTopic[] = ["transmit", "life"];
