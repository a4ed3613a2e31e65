import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type LostDecibelsParameters = {
  hours: readonly [number, number];
  depth: readonly [number, number];
  sector: readonly [number, number];
  nothing: number;
};

/** Ranges: common practice, no source; a fall of less than 3 dB is within what weather and season do to a station. */
export const lostDecibelsParameters: readonly ParameterSpec[] = [
  {
    name: "hours",
    label: "Length of the log",
    help: "Whole hours. A short log has a reading each 10 s, one of a day each 30 s.",
    input: "range",
    unit: "h",
    from: 2,
    to: 24,
    whole: true,
    default: [2, 24],
  },
  {
    name: "depth",
    label: "Depth of the fall",
    help: "How much C/N0 the fault takes.",
    input: "range",
    unit: "dB",
    from: 3,
    to: 15,
    whole: false,
    default: [3, 15],
  },
  {
    name: "sector",
    label: "Width of a blocked sector",
    help: "In azimuth.",
    input: "range",
    unit: "deg",
    from: 30,
    to: 90,
    whole: true,
    default: [30, 90],
  },
  {
    name: "nothing",
    label: "Share of cases in which nothing is wrong",
    help: "So many cases out of a hundred. The form does not show which.",
    input: "number",
    unit: "%",
    from: 0,
    to: 50,
    whole: false,
    default: 20,
  },
];
