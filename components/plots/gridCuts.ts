/** Cut through a grid along one row: power against lag at one Doppler. */
export const rowCut = (power: Float32Array, columns: number, row: number): Float32Array =>
  power.subarray(row * columns, (row + 1) * columns);

/** Cut through a grid along one column: power against Doppler at one lag. */
export const columnCut = (power: Float32Array, columns: number, column: number): Float32Array =>
  Float32Array.from({ length: Math.floor(power.length / columns) }, (_, row) => power[row * columns + column]);
