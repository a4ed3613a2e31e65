import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type SearchPlanParameters = {
  cn0: readonly [number, number];
  window: readonly [number, number];
  detection: readonly [number, number];
  falseAlarm: readonly [number, number];
  timeFactor: readonly [number, number];
};

/** Ranges: common practice, no source. */
export const searchPlanParameters: readonly ParameterSpec[] = [
  {
    name: "cn0",
    label: "C/N0 of the weakest satellite",
    help: "Drawn in steps of 0.5 dB.",
    input: "range",
    unit: "dB-Hz",
    from: 27,
    to: 40,
    whole: false,
    default: [29, 36],
  },
  {
    name: "window",
    label: "Doppler window",
    help: "Half width, drawn in steps of 500 Hz.",
    input: "range",
    unit: "Hz",
    from: 1000,
    to: 20_000,
    whole: false,
    default: [3000, 12_000],
  },
  {
    name: "detection",
    label: "Detection probability",
    help: "Asked of the plan; drawn in whole per cent.",
    input: "range",
    unit: "%",
    from: 80,
    to: 99,
    whole: true,
    default: [90, 99],
  },
  {
    name: "falseAlarm",
    label: "False-alarm probability of a search",
    help: "Over all cells of one satellite's search; drawn from 1, 2 and 5 times powers of ten.",
    input: "range",
    unit: "1",
    from: 1e-5,
    to: 1e-1,
    whole: false,
    default: [1e-4, 1e-2],
  },
  {
    name: "timeFactor",
    label: "Time limit over the fastest plan",
    help: "How many times as long as the fastest reference plan a search may take.",
    input: "range",
    unit: "1",
    from: 1.2,
    to: 5,
    whole: false,
    default: [1.5, 3],
  },
];
