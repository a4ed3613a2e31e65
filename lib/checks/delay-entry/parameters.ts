import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type DelayEntryParameters = {
  parts: readonly [number, number];
  length: readonly [number, number];
  velocityFactor: readonly [number, number];
  sign: "either" | "delay-is-positive" | "delay-is-negative";
};

/** Ranges: common practice, no source; a velocity factor is between solid and foam polyethylene. */
export const delayEntryParameters: readonly ParameterSpec[] = [
  {
    name: "parts",
    label: "Parts on the way",
    help: "How many parts the pulse's way has; antenna, two cables, receiver and 1PPS lead are always there.",
    input: "range",
    unit: "1",
    from: 5,
    to: 9,
    whole: true,
    default: [5, 9],
  },
  {
    name: "length",
    label: "Length of a cable run",
    help: "Of the antenna cable and of the run that is measured by its echo.",
    input: "range",
    unit: "m",
    from: 8,
    to: 120,
    whole: false,
    default: [8, 120],
  },
  {
    name: "velocityFactor",
    label: "Velocity factor",
    help: "About 0.66 for solid polyethylene, 0.83 to 0.88 for foam.",
    input: "range",
    unit: "1",
    from: 0.6,
    to: 0.9,
    whole: false,
    default: [0.66, 0.88],
  },
  {
    name: "sign",
    label: "What the receiver takes",
    help: "Whether a delay is typed in as a positive number, a negative one, or either from case to case.",
    input: "choice",
    choices: [
      { value: "either", label: "either" },
      { value: "delay-is-positive", label: "a delay is positive" },
      { value: "delay-is-negative", label: "a delay is negative" },
    ],
    default: "either",
  },
];
