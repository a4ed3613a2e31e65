/**
 * A grid with fewer columns: of the cells that fall together the strongest is kept, so that a peak one cell wide
 * is never lost.
 * @param power row after row
 * @param columns columns of the grid; `shown` at most as many
 */
export function mergeCells(power: ArrayLike<number>, columns: number, shown: number): Float32Array {
  const rows = Math.floor(power.length / columns);
  const merged = new Float32Array(rows * shown).fill(-Infinity);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const to = row * shown + Math.floor((column * shown) / columns);
      const value = power[row * columns + column];
      if (value > merged[to]) merged[to] = value;
    }
  }
  return merged;
}
