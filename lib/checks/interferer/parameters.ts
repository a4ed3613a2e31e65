import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type InterfererParameters = {
  level: readonly [number, number];
  centre: readonly [number, number];
  sweep: readonly [number, number];
  duty: readonly [number, number];
  nothing: number;
  durationMs: number;
};

/** Ranges: common practice, no source. */
export const interfererParameters: readonly ParameterSpec[] = [
  {
    name: "level",
    label: "Level over the floor in 1 MHz",
    help: "Mean power of the interference over the noise in 1 MHz. Pulses, noise and codes take the part of it that they can.",
    input: "range",
    unit: "dB",
    from: 10,
    to: 35,
    whole: false,
    default: [10, 35],
  },
  {
    name: "centre",
    label: "Centre from 1 575.42 MHz",
    help: "Distance to either side; a matched code stands within 60 kHz.",
    input: "range",
    unit: "kHz",
    from: 100,
    to: 1500,
    whole: false,
    default: [150, 1500],
  },
  {
    name: "sweep",
    label: "Sweep period",
    help: "Time of one sweep.",
    input: "range",
    unit: "us",
    from: 8,
    to: 200,
    whole: false,
    default: [8, 200],
  },
  {
    name: "duty",
    label: "Share of time that pulses are on",
    help: "On-time over repetition.",
    input: "range",
    unit: "%",
    from: 1,
    to: 20,
    whole: false,
    default: [1, 20],
  },
  {
    name: "nothing",
    label: "Share of cases with nothing there",
    help: "So many cases out of a hundred hold the receiver's own noise alone. The form does not show which.",
    input: "number",
    unit: "%",
    from: 0,
    to: 50,
    whole: false,
    default: 15,
  },
  {
    name: "durationMs",
    label: "Length of the capture",
    help: "10 ms are 164 kB to fetch, 50 ms are 819 kB.",
    input: "number",
    unit: "ms",
    from: 10,
    to: 50,
    whole: true,
    default: 10,
  },
];
