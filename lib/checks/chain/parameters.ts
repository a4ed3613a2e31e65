import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type ChainParameters = {
  run: readonly [number, number];
  neighbour: readonly [number, number];
  /** In per cent of the cases. */
  splitter: number;
};

/** Ranges: common practice, no source. */
export const chainParameters: readonly ParameterSpec[] = [
  {
    name: "run",
    label: "Run of cable",
    help: "From the antenna to the entry, in whole metres.",
    input: "range",
    unit: "m",
    from: 5,
    to: 150,
    whole: true,
    default: [8, 120],
  },
  {
    name: "neighbour",
    label: "Neighbour's signal",
    help: "Level at the antenna's terminals.",
    input: "range",
    unit: "dBm",
    from: -50,
    to: -10,
    whole: true,
    default: [-50, -10],
  },
  {
    name: "splitter",
    label: "Cases with a second receiver",
    help: "In these the chain needs a splitter.",
    input: "number",
    unit: "%",
    from: 0,
    to: 100,
    whole: false,
    default: 50,
  },
];
