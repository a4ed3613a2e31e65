import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type Cn0Parameters = {
  weakest: readonly [number, number];
  strongest: readonly [number, number];
};

/**
 * Ranges: common practice, no source. Above 29 dB-Hz the method of moments no longer fails in 2 s, and the choice of the
 * method would not show; below 27 the bit edges are often not found.
 */
export const cn0Parameters: readonly ParameterSpec[] = [
  {
    name: "weakest",
    label: "C/N0 of the weakest channel",
    help: "Drawn from this range. The nearer to 27 dB-Hz, the more the method counts.",
    input: "range",
    unit: "dB-Hz",
    from: 27,
    to: 29,
    whole: false,
    default: [28, 28.5],
  },
  {
    name: "strongest",
    label: "C/N0 of the strongest channel",
    help: "Drawn from this range. The other two lie between, all four at least 4 dB apart.",
    input: "range",
    unit: "dB-Hz",
    from: 44,
    to: 50,
    whole: false,
    default: [45, 48],
  },
];
