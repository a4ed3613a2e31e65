/** Indexes of the local maxima of a row of values, strongest first; a flat top counts once, ends count too. */
export function rowPeaks(values: ArrayLike<number>): number[] {
  const found: number[] = [];
  for (let at = 0; at < values.length; at++) {
    const before = at === 0 ? -Infinity : values[at - 1];
    const after = at === values.length - 1 ? -Infinity : values[at + 1];
    if (values[at] > before && values[at] >= after) found.push(at);
  }
  return found.sort((a, b) => values[b] - values[a]);
}

/**
 * Strongest cells of a grid, each at least `apart` cells from the ones before it: the order in which P visits them.
 * @param power row after row
 */
export function gridPeaks(
  power: ArrayLike<number>,
  columns: number,
  apart: { rows: number; columns: number },
  most = 12,
): number[] {
  const rows = Math.floor(power.length / columns);
  const candidates: number[] = [];
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++)
      if (isTop(power, rows, columns, row, column)) candidates.push(row * columns + column);
  }
  candidates.sort((a, b) => power[b] - power[a]);
  const kept: number[] = [];
  for (const cell of candidates) {
    if (kept.length === most) break;
    if (kept.every((other) => !near(cell, other, columns, apart))) kept.push(cell);
  }
  return kept;
}

function isTop(power: ArrayLike<number>, rows: number, columns: number, row: number, column: number): boolean {
  const value = power[row * columns + column];
  for (let r = Math.max(0, row - 1); r <= Math.min(rows - 1, row + 1); r++) {
    for (let c = Math.max(0, column - 1); c <= Math.min(columns - 1, column + 1); c++)
      if (power[r * columns + c] > value) return false;
  }
  return true;
}

/** Lags lie on a circle: the last column is next to the first. */
function near(a: number, b: number, columns: number, apart: { rows: number; columns: number }): boolean {
  const across = Math.abs((a % columns) - (b % columns));
  const up = Math.abs(Math.floor(a / columns) - Math.floor(b / columns));
  return up < apart.rows && Math.min(across, columns - across) < apart.columns;
}
