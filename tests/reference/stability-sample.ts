/*
 * Riley, "Handbook of Frequency Stability Analysis", NIST Special Publication 1065 (2008), 12.4: the 1000-point
 * frequency data set and the deviations printed for it (tau in units of the interval). Figures from memory; the data
 * follow from the printed recipe alone, n' = 16807 n mod 2147483647 from n = 1234567890, divided by 2147483647.
 */
export function stabilitySampleFrequencies(): number[] {
  const values: number[] = [];
  let state = 1234567890n;
  for (let n = 0; n < 1000; n++) {
    values.push(Number(state) / 2147483647);
    state = (16807n * state) % 2147483647n;
  }
  return values;
}

/** Deviations of the set, all overlapping, by the number of intervals averaged. */
export const STABILITY_SAMPLE_DEVIATIONS = [
  { intervals: 1, allan: 2.922319e-1, modified: 2.922319e-1, time: 1.687202e-1 },
  { intervals: 10, allan: 9.159953e-2, modified: 6.172376e-2, time: 3.563623e-1 },
  { intervals: 100, allan: 3.241343e-2, modified: 2.170921e-2, time: 1.253382 },
] as const;
