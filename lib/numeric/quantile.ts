/**
 * Value below which a share of a population lies, from a sample: place share * (N + 1) among the sorted values, between two
 * of them in proportion, and never beyond the least and the greatest. NIST/SEMATECH e-Handbook of Statistical Methods,
 * 7.2.6.2. A half gives the median.
 * @param share above 0, below 1
 * @throws RangeError when there is no value
 */
export function quantile(values: ArrayLike<number>, share: number): number {
  if (values.length === 0) throw new RangeError("quantile: at least one value");
  if (!(share > 0 && share < 1)) throw new RangeError(`quantile: share between 0 and 1, got ${share}`);
  const sorted = Float64Array.from(values).sort();
  const place = share * (sorted.length + 1);
  if (place <= 1) return sorted[0];
  if (place >= sorted.length) return sorted[sorted.length - 1];
  const below = Math.floor(place);
  return sorted[below - 1] + (place - below) * (sorted[below] - sorted[below - 1]);
}
