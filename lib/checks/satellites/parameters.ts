import type { ParameterSpec } from "../kind";
import { rateParameter, type CaptureRate } from "../capture-rate";

/** Ends of ranges are included. */
export type SatellitesParameters = {
  satellites: readonly [number, number];
  cn0: readonly [number, number];
  motion: number;
  clock: number;
  foundFrom: number;
  rate: CaptureRate;
};

/** Ranges: common practice, no source. Above 45 dB-Hz a satellite leaves false peaks, which are another check's matter. */
export const satellitesParameters: readonly ParameterSpec[] = [
  {
    name: "satellites",
    label: "Number of satellites",
    help: "So many are in the capture.",
    input: "range",
    unit: "1",
    from: 4,
    to: 12,
    whole: true,
    default: [5, 9],
  },
  {
    name: "cn0",
    label: "C/N0",
    help: "Each satellite's C/N0 is drawn from this range.",
    input: "range",
    unit: "dB-Hz",
    from: 32,
    to: 45,
    whole: false,
    default: [34, 43],
  },
  {
    name: "motion",
    label: "Doppler from satellite motion",
    help: "Half width; the clock offset comes on top.",
    input: "number",
    unit: "Hz",
    from: 500,
    to: 5000,
    whole: false,
    default: 4500,
  },
  {
    name: "clock",
    label: "Receiver clock offset",
    help: "Half width of the common offset. One ppm moves every Doppler by 1 575 Hz.",
    input: "number",
    unit: "ppm",
    from: 0,
    to: 5,
    whole: false,
    default: 2.5,
  },
  {
    name: "foundFrom",
    label: "Must be found from",
    help: "Satellites of at least this C/N0 must be listed; weaker ones are extra.",
    input: "number",
    unit: "dB-Hz",
    from: 34,
    to: 42,
    whole: false,
    default: 36,
  },
  rateParameter("either"),
];
