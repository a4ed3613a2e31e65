import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type CorrelatorReadingParameters = {
  prn: readonly [number, number];
  cn0T: readonly [number, number];
  falseAlarm: number;
  noiseOnly: number;
};

/** Ranges: common practice, no source; below 14 dB even the right reading is often more than 0.2 chip off. */
export const correlatorReadingParameters: readonly ParameterSpec[] = [
  {
    name: "prn",
    label: "PRN",
    help: "The satellite of the trace is drawn from this range.",
    input: "range",
    unit: "1",
    from: 1,
    to: 32,
    whole: true,
    default: [1, 32],
  },
  {
    name: "cn0T",
    label: "C/N0 times coherent time",
    help: "How far the peak stands out of the noise: C/N0 in dB-Hz plus 10 log of the coherent time in seconds.",
    input: "range",
    unit: "dB",
    from: 14,
    to: 30,
    whole: false,
    default: [16, 24],
  },
  {
    name: "falseAlarm",
    label: "False-alarm probability of one cell",
    help: "Sets the threshold that is asked.",
    input: "number",
    unit: "1",
    from: 1e-8,
    to: 1e-5,
    whole: false,
    default: 1e-6,
  },
  {
    name: "noiseOnly",
    label: "Share of cases with noise only",
    help: "So many cases out of a hundred hold no signal. The form does not show which.",
    input: "number",
    unit: "%",
    from: 0,
    to: 50,
    whole: false,
    default: 20,
  },
];
