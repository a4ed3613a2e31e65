import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type LocateParameters = {
  stops: readonly [number, number];
  spread: readonly [number, number];
  intermittent: number;
};

/** Ranges: common practice, no source. */
export const locateParameters: readonly ParameterSpec[] = [
  {
    name: "stops",
    label: "Stops with a bearing",
    help: "One of them sees a reflection.",
    input: "range",
    unit: "1",
    from: 6,
    to: 12,
    whole: true,
    default: [7, 9],
  },
  {
    name: "spread",
    label: "Spread of a bearing",
    help: "Standard deviation, drawn for each stop in whole degrees.",
    input: "range",
    unit: "deg",
    from: 2,
    to: 10,
    whole: true,
    default: [2, 6],
  },
  {
    name: "intermittent",
    label: "Share of cases with an interferer that is off at times",
    help: "So many cases out of a hundred have stops at which nothing was heard.",
    input: "number",
    unit: "%",
    from: 0,
    to: 100,
    whole: false,
    default: 50,
  },
];
