import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type SidePeakParameters = {
  cn0T: readonly [number, number];
  bandwidth: readonly [number, number];
  mainShare: number;
};

/** Ranges: common practice, no source; below 33 dB noise moves the side peaks by more than a careful reading may be off. */
export const sidePeakParameters: readonly ParameterSpec[] = [
  {
    name: "cn0T",
    label: "C/N0 times averaging time",
    help: "How far the main peak stands out of the noise: C/N0 in dB-Hz plus 10 log of the averaging time in seconds.",
    input: "range",
    unit: "dB",
    from: 33,
    to: 46,
    whole: false,
    default: [35, 40],
  },
  {
    name: "bandwidth",
    label: "Bandwidth of the receiver",
    help: "Two-sided. The narrower it is, the rounder the peaks are and the farther out the side peaks stand.",
    input: "range",
    unit: "MHz",
    from: 5,
    to: 24,
    whole: false,
    default: [6, 16],
  },
  {
    name: "mainShare",
    label: "Share of cases on the main peak",
    help: "So many cases out of a hundred are tracked rightly. The form does not show which.",
    input: "number",
    unit: "%",
    from: 0,
    to: 60,
    whole: false,
    default: 35,
  },
];
