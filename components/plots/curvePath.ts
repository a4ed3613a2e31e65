import type { PlotGeometry } from "./geometry";

export type Points = { x: ArrayLike<number>; y: ArrayLike<number> };

/**
 * Path of a curve. More points than px columns are thinned to the first, lowest, highest and last of each column,
 * so that no peak is lost; a value that is not a number breaks the line.
 */
export function curvePath({ x, y }: Points, g: Pick<PlotGeometry, "x" | "y" | "left" | "right">): string {
  const count = Math.min(x.length, y.length);
  const dense = count > 4 * Math.max(1, g.right - g.left);
  return dense ? thinned(x, y, count, g) : direct(x, y, count, g);
}

function direct(x: ArrayLike<number>, y: ArrayLike<number>, count: number, g: Pick<PlotGeometry, "x" | "y">): string {
  const path: string[] = [];
  let pen = "M";
  for (let at = 0; at < count; at++) {
    if (!Number.isFinite(y[at])) {
      pen = "M";
      continue;
    }
    path.push(`${pen}${place(g.x(x[at]))} ${place(g.y(y[at]))}`);
    pen = "L";
  }
  return path.join("");
}

function thinned(x: ArrayLike<number>, y: ArrayLike<number>, count: number, g: Pick<PlotGeometry, "x" | "y">): string {
  const kept: number[] = [];
  let at = 0;
  while (at < count) {
    const column = Math.floor(g.x(x[at]));
    let low = at;
    let high = at;
    let next = at;
    while (next < count && Math.floor(g.x(x[next])) === column) {
      if (y[next] < y[low]) low = next;
      if (y[next] > y[high]) high = next;
      next++;
    }
    kept.push(...[...new Set([at, low, high, next - 1])].sort((a, b) => a - b));
    at = next;
  }
  return kept.map((index, order) => `${order ? "L" : "M"}${place(g.x(x[index]))} ${place(g.y(y[index]))}`).join("");
}

/** Hundredths of a px are below what a screen shows. */
const place = (px: number) => Math.round(px * 100) / 100;
