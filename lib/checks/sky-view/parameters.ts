import { formatUnderstood } from "../formatUnderstood";
import type { ParameterSpec } from "../kind";

export type SkyViewParameters = {
  mask: number;
  total: number;
  quadrant: number;
  /** In per cent of the cases. */
  noneFit: number;
};

/** Limits: a receiver manufacturer's siting guide (25 % in all, 12.5 % in one quadrant). Ranges: common practice, no source. */
export const skyViewParameters: readonly ParameterSpec[] = [
  {
    name: "mask",
    label: "Elevation mask",
    help: "Sky below it does not count.",
    input: "number",
    unit: "deg",
    from: 5,
    to: 15,
    whole: true,
    default: 10,
  },
  {
    name: "total",
    label: "Most that may be blocked in all",
    help: "Share of the sky above the mask.",
    input: "number",
    unit: "%",
    from: 20,
    to: 35,
    whole: false,
    default: 25,
  },
  {
    name: "quadrant",
    label: "Most that may be blocked in one quadrant",
    help: "Share of the whole sky above the mask, as in the limit in all.",
    input: "number",
    unit: "%",
    from: 10,
    to: 15,
    whole: false,
    default: 12.5,
  },
  {
    name: "noneFit",
    label: "Cases in which no position will do",
    help: "In these the right choice is none of them.",
    input: "number",
    unit: "%",
    from: 0,
    to: 50,
    whole: false,
    default: 20,
  },
];

const LEAST_BETWEEN = 8; // per cent; else no horizon breaks the quadrant's limit alone and clearly

/** A quadrant's limit must bite before the limit in all does. */
export function skyViewParametersProblem({ total, quadrant }: SkyViewParameters) {
  if (total - quadrant >= LEAST_BETWEEN) return null;
  const most = formatUnderstood(total - LEAST_BETWEEN, "%");
  return { name: "quadrant", message: `With this limit in all, the limit in one quadrant may be up to ${most}.` };
}
