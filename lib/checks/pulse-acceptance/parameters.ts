import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type PulseAcceptanceParameters = {
  limit: "either" | "PRTC-A" | "PRTC-B";
  wave: readonly [number, number];
  sawtooth: readonly [number, number];
  step: readonly [number, number];
  stepless: number;
  triggers: readonly [number, number];
};

/** Ranges: common practice, no source. */
export const pulseAcceptanceParameters: readonly ParameterSpec[] = [
  {
    name: "limit",
    label: "Limit",
    help: "Class of clock whose limit of max|TE| is to be kept.",
    input: "choice",
    choices: [
      { value: "either", label: "either, from case to case" },
      { value: "PRTC-A", label: "PRTC-A, 100 ns" },
      { value: "PRTC-B", label: "PRTC-B, 40 ns" },
    ],
    default: "either",
  },
  {
    name: "wave",
    label: "Daily wave",
    help: "Amplitude of the wave that the day's warmth draws.",
    input: "range",
    unit: "ns",
    from: 0,
    to: 30,
    whole: false,
    default: [2, 20],
  },
  {
    name: "sawtooth",
    label: "Sawtooth",
    help: "Peak to peak, of a pulse that leaves on the edges of the receiver's own clock.",
    input: "range",
    unit: "ns",
    from: 0,
    to: 20,
    whole: false,
    default: [3, 15],
  },
  {
    name: "step",
    label: "Step",
    help: "Size of the lasting step; one that the sawtooth would hide is drawn again.",
    input: "range",
    unit: "ns",
    from: 8,
    to: 80,
    whole: false,
    default: [8, 60],
  },
  {
    name: "stepless",
    label: "Share of cases without a step",
    help: "So many cases out of a hundred. The form does not show which.",
    input: "number",
    unit: "%",
    from: 0,
    to: 50,
    whole: false,
    default: 20,
  },
  {
    name: "triggers",
    label: "Missed triggers",
    help: "Readings of a counter that missed its pulse.",
    input: "range",
    unit: "1",
    from: 0,
    to: 5,
    whole: true,
    default: [0, 3],
  },
];
