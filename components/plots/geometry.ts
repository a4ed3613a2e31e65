import { formatNumber } from "@/components/ui/formatNumber";
import { axisTicks, type Ticks } from "./ticks";

export type Axis = {
  /** Quantity and unit in words: "code phase, chip". */
  name: string;
  from: number;
  to: number;
  /** Labelled values, where the plot's own choice does not serve. */
  ticks?: readonly number[];
  decimals?: number;
  /** Shows a plus: Doppler, differences, levels. */
  signed?: boolean;
  /** Word of a tick, where it is no figure: a part's name, a power of ten. */
  text?: (value: number) => string;
};

export type PlotGeometry = {
  width: number;
  height: number;
  left: number;
  right: number;
  top: number;
  bottom: number;
  x: (value: number) => number;
  y: (value: number) => number;
  xAt: (px: number) => number;
  yAt: (px: number) => number;
  xTicks: Ticks;
  yTicks: Ticks;
  xLabel: (value: number) => string;
  yLabel: (value: number) => string;
};

export type Margins = { left?: number; right?: number };

const TOP = 24;
const BOTTOM = 42;
const RIGHT = 12;
/** Width of one figure of a label at 12 px, rounded up. */
export const FIGURE_PX = 7.2;
const WORD_PX = 6.2; // of one letter, the mean of a word
/** Labels of the x axis stand side by side; those of the y axis only need their own height. */
export const MIN_GAP_X_PX = 56;
export const MIN_GAP_Y_PX = 22;

/** Where things stand in a plot of this size: the one place that turns values into px and back. */
export function plotGeometry(width: number, height: number, x: Axis, y: Axis, margins: Margins = {}): PlotGeometry {
  const top = TOP;
  const bottom = height - BOTTOM;
  const yTicks = ticksOf(y, bottom - top, MIN_GAP_Y_PX);
  const yLabel = labelOf(y, yTicks);
  const longest = Math.max(1, ...yTicks.major.map((value) => yLabel(value).length));
  const left = margins.left ?? Math.max(36, Math.ceil(longest * FIGURE_PX) + 14);
  const right = width - (margins.right ?? RIGHT);
  const xTicks = ticksOf(x, right - left, MIN_GAP_X_PX);
  const perX = (right - left) / (x.to - x.from);
  const perY = (bottom - top) / (y.to - y.from);
  return {
    width,
    height,
    left,
    right,
    top,
    bottom,
    x: (value) => left + (value - x.from) * perX,
    y: (value) => bottom - (value - y.from) * perY,
    xAt: (px) => x.from + (px - left) / perX,
    yAt: (px) => y.from + (bottom - px) / perY,
    xTicks,
    yTicks,
    xLabel: labelOf(x, xTicks),
    yLabel,
  };
}

function ticksOf(axis: Axis, lengthPx: number, minGapPx: number): Ticks {
  const own = axisTicks(axis.from, axis.to, lengthPx, minGapPx);
  if (!axis.ticks) return own;
  const decimals = Math.max(0, ...axis.ticks.map((value) => `${value}`.split(".")[1]?.length ?? 0));
  const shown = axis.ticks.filter((value) => value >= axis.from && value <= axis.to);
  const longest = Math.max(
    0,
    ...shown.map((value) => (axis.text?.(value) ?? formatNumber(value, axis.decimals ?? decimals, axis.signed)).length),
  );
  // Words are as long as they are; of figures some may be left out where a tick keeps its distance.
  const gap = axis.text ? longest * WORD_PX + 10 : Math.min(minGapPx, longest * FIGURE_PX + 10);
  return { major: spaced(shown, lengthPx / (axis.to - axis.from), gap), minor: [], decimals };
}

/** Labels drop before they touch. */
function spaced(values: readonly number[], pxPerUnit: number, minGapPx: number): number[] {
  const kept: number[] = [];
  for (const value of values)
    if (kept.length === 0 || (value - kept[kept.length - 1]) * pxPerUnit >= minGapPx) kept.push(value);
  return kept;
}

const labelOf = (axis: Axis, ticks: Ticks) => (value: number) =>
  axis.text?.(value) ?? formatNumber(value, axis.decimals ?? ticks.decimals, axis.signed);
