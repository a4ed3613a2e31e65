import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type StandOffParameters = {
  eirp: readonly [number, number];
  exponent: readonly [number, number];
  screen: readonly [number, number];
  antennaGain: readonly [number, number];
  cn0: readonly [number, number];
  threshold: readonly [number, number];
};

/** Ranges: common practice, no source. */
export const standOffParameters: readonly ParameterSpec[] = [
  {
    name: "eirp",
    label: "EIRP of the interferer",
    help: "Drawn from 1, 2 and 5 times powers of ten in mW; the case gives it in mW.",
    input: "range",
    unit: "dBm",
    from: -20,
    to: 40,
    whole: false,
    default: [0, 30],
  },
  {
    name: "exponent",
    label: "Path exponent",
    help: "2 in free space, 3 to 4 along the ground between buildings; drawn in steps of 0.5.",
    input: "range",
    unit: "1",
    from: 2,
    to: 4,
    whole: false,
    default: [2, 4],
  },
  {
    name: "screen",
    label: "Loss of what stands between",
    help: "Walls, hills, a screen; drawn in whole dB.",
    input: "range",
    unit: "dB",
    from: 0,
    to: 40,
    whole: true,
    default: [0, 20],
  },
  {
    name: "antennaGain",
    label: "Antenna gain low down",
    help: "Of the GNSS antenna towards the interferer; drawn in whole dB.",
    input: "range",
    unit: "dB",
    from: -15,
    to: -3,
    whole: true,
    default: [-9, -4],
  },
  {
    name: "cn0",
    label: "C/N0 of the satellites",
    help: "Without interference; drawn in steps of 0.5 dB.",
    input: "range",
    unit: "dB-Hz",
    from: 33,
    to: 52,
    whole: false,
    default: [36, 50],
  },
  {
    name: "threshold",
    label: "C/N0 that the receiver needs",
    help: "Drawn in whole dB.",
    input: "range",
    unit: "dB-Hz",
    from: 20,
    to: 32,
    whole: true,
    default: [25, 31],
  },
];
