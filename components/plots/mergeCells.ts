/** Cells row after row. */
export type Cells = { power: Float32Array; columns: number };

/**
 * A grid with at most so many rows and columns: of the cells that fall together the strongest is kept, so that a peak one
 * cell wide is never lost.
 */
export function mergeCells({ power, columns }: Cells, mostRows: number, mostColumns: number): Cells {
  const rows = Math.floor(power.length / columns);
  const shownRows = Math.min(rows, mostRows);
  const shown = Math.min(columns, mostColumns);
  const merged = new Float32Array(shownRows * shown).fill(-Infinity);
  const to = Uint32Array.from({ length: columns }, (_, column) => Math.floor((column * shown) / columns));
  for (let row = 0; row < rows; row++) {
    const start = Math.floor((row * shownRows) / rows) * shown;
    for (let column = 0; column < columns; column++) {
      const value = power[row * columns + column];
      if (value > merged[start + to[column]]) merged[start + to[column]] = value;
    }
  }
  return { power: merged, columns: shown };
}
