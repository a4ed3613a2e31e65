/**
 * Standard deviation of the correlation of two random codes, as a fraction of the full peak: 1/sqrt(N), -30.1 dB for 1023
 * chips. Common practice, no source.
 * @param lengthChips N, from 1
 */
export function randomCodeDeviation(lengthChips: number): number {
  if (!(lengthChips >= 1)) throw new RangeError(`randomCodeDeviation: length from 1, got ${lengthChips}`);
  return 1 / Math.sqrt(lengthChips);
}
