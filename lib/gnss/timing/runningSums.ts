/**
 * Sums from which the sum and the number of missing readings of any stretch follow by one subtraction.
 * @param values NaN where a reading is missing
 * @returns sums[n]: the first n readings present, each less `zero`, which keeps digits when all are far from 0;
 *   missing[n]: how many of them are missing
 */
export function runningSums(values: Float64Array): { sums: Float64Array; missing: Int32Array; zero: number } {
  const sums = new Float64Array(values.length + 1);
  const missing = new Int32Array(values.length + 1);
  const zero = values.find((value) => !Number.isNaN(value)) ?? 0;
  for (let n = 0; n < values.length; n++) {
    const absent = Number.isNaN(values[n]);
    sums[n + 1] = sums[n] + (absent ? 0 : values[n] - zero);
    missing[n + 1] = missing[n] + (absent ? 1 : 0);
  }
  return { sums, missing, zero };
}
