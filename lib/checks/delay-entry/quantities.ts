import type { CautionTopic, QuantityDefinition } from "../kind";

/** Least tolerance of a delay in ns: what is left of a cut cable end, a connector pair and the rounding of a sheet. */
export const LEAST_NS = 1;

export const delayEntryQuantities: readonly QuantityDefinition[] = [
  {
    id: "echo",
    label: "Echoes read",
    unit: "ns",
    tolerance: { value: 1.5, unit: "ns" },
    toleranceRange: { from: 0.5, to: 5, unit: "ns" },
    critical: false,
    reason: "Points are 0.5 ns apart and an edge takes 2 to 4 ns to rise; half-way up can be read to one point or two.",
  },
  {
    id: "parts",
    label: "Delay of each part",
    unit: "ns",
    tolerance: { value: 1, unit: "%" },
    toleranceRange: { from: 0.5, to: 5, unit: "%" },
    critical: false,
    reason: "Arithmetic from the papers; the run without papers is judged from your own echoes.",
  },
  {
    id: "total",
    label: "Total delay",
    unit: "ns",
    tolerance: { value: 1, unit: "%" },
    toleranceRange: { from: 0.5, to: 5, unit: "%" },
    critical: false,
    reason: "A sum, judged from your own parts.",
  },
  {
    id: "entry",
    label: "Value to enter, with its sign",
    unit: "ns",
    tolerance: { value: 1, unit: "%" },
    toleranceRange: { from: 0.5, to: 5, unit: "%" },
    critical: true,
    reason: "Judged from your own total. The wrong sign doubles the error that the value was to take away.",
  },
  {
    id: "uncertainty",
    label: "Standard uncertainty of the total",
    unit: "ns",
    tolerance: { value: 25, unit: "%" },
    toleranceRange: { from: 5, to: 50, unit: "%" },
    critical: false,
    reason: "Stated uncertainties are no better known than this. Added straight, or limits left as limits, is outside.",
  },
];

export const delayEntryCautions: readonly CautionTopic[] = ["height", "lightning", "life"];
