import type { CautionTopic, Choice, QuantityDefinition } from "../kind";

export const POSITIONS = ["A", "B", "C"] as const;
export type PositionId = (typeof POSITIONS)[number];
export const NONE = "none";

export const CHOICES: readonly Choice[] = [
  ...POSITIONS.map((id) => ({ value: id, label: `Position ${id}` })),
  { value: NONE, label: "None of them" },
];

/** In order of azimuth: the first runs from 0 to 90 deg. */
export const QUADRANTS: readonly Choice[] = [
  { value: "north-east", label: "North to east" },
  { value: "south-east", label: "East to south" },
  { value: "south-west", label: "South to west" },
  { value: "north-west", label: "West to north" },
];

export const skyViewCautions: readonly CautionTopic[] = ["height", "lightning", "rf", "life"];

export const skyViewQuantities: readonly QuantityDefinition[] = [
  {
    id: "choice",
    label: "Position to choose",
    unit: null,
    choices: CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "What the antenna cannot see, no receiver brings back; moving it later is a second climb.",
  },
  {
    id: "blocked",
    label: "Sky blocked in all",
    unit: "%",
    tolerance: { value: 2, unit: "%" },
    toleranceRange: { from: 0.5, to: 2, unit: "%" },
    critical: false,
    reason: "A sum over the pieces of a horizon; half a degree in each of them moves it by less than one point.",
  },
  {
    id: "quadrant",
    label: "Worst quadrant",
    unit: null,
    choices: QUADRANTS,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "The second worst is clearly better in every case.",
  },
  {
    id: "quadrantBlocked",
    label: "Sky blocked in that quadrant",
    unit: "%",
    tolerance: { value: 1, unit: "%" },
    toleranceRange: { from: 0.5, to: 1.5, unit: "%" },
    critical: false,
    reason: "Judged for the quadrant that you named; a quarter of the pieces, so half of the tolerance in all.",
  },
  {
    id: "room",
    label: "Room to the tightest emitter",
    unit: "m",
    tolerance: { value: 0.5, unit: "m" },
    toleranceRange: { from: 0.2, to: 0.5, unit: "m" },
    critical: false,
    reason: "A distance between two places on the plan; an antenna on its mount is placed no better than this.",
  },
];
