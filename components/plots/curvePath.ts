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
  const path: string[] = [];
  let pen = "M";
  let at = 0;
  while (at < count) {
    const column = Math.floor(g.x(x[at]));
    const drawn: number[] = [];
    let next = at;
    for (; next < count && Math.floor(g.x(x[next])) === column; next++) if (Number.isFinite(y[next])) drawn.push(next);
    for (const index of outermost(drawn, y)) {
      path.push(`${pen}${place(g.x(x[index]))} ${place(g.y(y[index]))}`);
      pen = "L";
    }
    if (drawn.length < next - at) pen = "M";
    at = next;
  }
  return path.join("");
}

/** First, lowest, highest and last of the points of one column, in their order. */
function outermost(drawn: readonly number[], y: ArrayLike<number>): number[] {
  if (drawn.length === 0) return [];
  let [low, high] = [drawn[0], drawn[0]];
  for (const at of drawn) {
    if (y[at] < y[low]) low = at;
    if (y[at] > y[high]) high = at;
  }
  return [...new Set([drawn[0], low, high, drawn[drawn.length - 1]])].sort((a, b) => a - b);
}

/** Hundredths of a px are below what a screen shows. */
const place = (px: number) => Math.round(px * 100) / 100;
