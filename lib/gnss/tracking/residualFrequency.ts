import { atan2, PI } from "@/lib/numeric/elementary";

/**
 * Frequency in Hz that a loop has left in its prompts: the mean turn from one code period to the next inside the data
 * bits, over the period. A Costas loop whose sums last a bit of 20 ms can stand still 25 Hz off, a false lock that its
 * own discriminator does not see and this shows. Range +-1/(2 T).
 * @param prompts complex sums of code periods, real and imaginary parts alternating
 * @param edge code period at which a bit begins
 */
export function residualFrequencyHz(
  prompts: ArrayLike<number>,
  edge: number,
  periodsPerBit: number,
  periodS: number,
): number {
  let [dot, cross] = [0, 0];
  for (let n = edge; n + 1 < prompts.length / 2; n++) {
    if ((n + 1 - edge) % periodsPerBit === 0) continue; // the next period belongs to another bit
    const [re, im, nextRe, nextIm] = [prompts[2 * n], prompts[2 * n + 1], prompts[2 * n + 2], prompts[2 * n + 3]];
    dot += re * nextRe + im * nextIm;
    cross += re * nextIm - im * nextRe;
  }
  return atan2(cross, dot) / (2 * PI * periodS);
}
