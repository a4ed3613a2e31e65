import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type JammedOrNotParameters = {
  span: readonly [number, number];
  depth: readonly [number, number];
};

/** Ranges: common practice, no source; below 4 dB a receiver's own wander hides what happens. */
export const jammedOrNotParameters: readonly ParameterSpec[] = [
  {
    name: "span",
    label: "Length of the log",
    help: "Whole minutes, a reading each 5 s.",
    input: "range",
    unit: "min",
    from: 40,
    to: 120,
    whole: true,
    default: [60, 120],
  },
  {
    name: "depth",
    label: "Loss of C/N0",
    help: "What jamming, an obstacle or a failing amplifier takes.",
    input: "range",
    unit: "dB",
    from: 4,
    to: 15,
    whole: false,
    default: [4, 15],
  },
];
