import { mean } from "./statistics";

/**
 * Correlation of a yes or no with a number: (M1 - M0) / s * sqrt(p q), with the means of the number over yes and over no, its
 * standard deviation divided by N, and the shares p of yes and q of no. It is the product-moment correlation with 1 for yes
 * and 0 for no. The formula from memory; it stands in any handbook of psychometrics.
 * @param yes one for each value
 * @returns -1 to 1; null where either never changes, since nothing can go together with it
 * @throws RangeError when the lengths differ
 */
export function pointBiserial(yes: readonly boolean[], values: readonly number[]): number | null {
  if (yes.length !== values.length)
    throw new RangeError(`pointBiserial: equal lengths, got ${yes.length} and ${values.length}`);
  const [with1, with0] = [values.filter((_, n) => yes[n]), values.filter((_, n) => !yes[n])];
  // Held against the first value: a rounded deviation of equal ones need not be 0.
  if (with1.length === 0 || with0.length === 0 || values.every((value) => value === values[0])) return null;
  const middle = mean(values);
  const deviation = Math.sqrt(mean(values.map((value) => (value - middle) * (value - middle))));
  const shares = Math.sqrt(with1.length * with0.length) / values.length;
  return Math.min(1, Math.max(-1, ((mean(with1) - mean(with0)) / deviation) * shares));
}
