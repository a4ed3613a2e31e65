import { rateParameter, type CaptureRate } from "../capture-rate";
import type { ParameterSpec } from "../kind";

/** Ends of ranges are included. */
export type FalseLockParameters = {
  parentCn0: readonly [number, number];
  others: readonly [number, number];
  othersCn0: readonly [number, number];
  decoyCn0: readonly [number, number];
  decoy: number;
  rate: CaptureRate;
};

/** Ranges: common practice, no source. A satellite of 46 dB-Hz raises false peaks of its own in a search of 10 x 10 ms. */
export const falseLockParameters: readonly ParameterSpec[] = [
  {
    name: "parentCn0",
    label: "C/N0 of the strong satellite",
    help: "Its false peaks come out 21 to 22 dB lower.",
    input: "range",
    unit: "dB-Hz",
    from: 50,
    to: 54,
    whole: false,
    default: [50, 53],
  },
  {
    name: "others",
    label: "Number of other satellites",
    help: "Tracked, in open sky.",
    input: "range",
    unit: "1",
    from: 3,
    to: 8,
    whole: true,
    default: [4, 7],
  },
  {
    name: "othersCn0",
    label: "C/N0 of the other satellites",
    help: "Each one is drawn from this range.",
    input: "range",
    unit: "dB-Hz",
    from: 36,
    to: 44,
    whole: false,
    default: [38, 44],
  },
  {
    name: "decoyCn0",
    label: "C/N0 of the weak genuine satellite",
    help: "Where there is one; about as strong as the false lock.",
    input: "range",
    unit: "dB-Hz",
    from: 29,
    to: 35,
    whole: false,
    default: [29, 33],
  },
  {
    name: "decoy",
    label: "Share of cases with a weak genuine satellite",
    help: "So many cases out of a hundred hold it. Sky plot and report do not show which.",
    input: "number",
    unit: "%",
    from: 0,
    to: 100,
    whole: false,
    default: 50,
  },
  rateParameter("2.046"),
];
