import { DATA_BIT_MS } from "@/lib/gnss/constants";
import { bitFrequencyHz, bitSums, turnedBack } from "@/lib/gnss/tracking/bitSums";
import { narrowWideCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { findBitEdge } from "@/lib/gnss/tracking/findBitEdge";
import { decibels } from "@/lib/numeric/elementary";

/** A code period of L1 C/A: how long one prompt lasts. */
export const PROMPT_S = 0.001;
const BIT_S = DATA_BIT_MS * PROMPT_S;

export type Estimate = { edge: number; residualHz: number; cn0DbHz: number };

/**
 * The right method: bit edge from the energy in whole bits, residual from their squares and taken out, then narrow over
 * wide power inside the bits.
 * @param prompts of 1 ms, real and imaginary parts alternating
 * @returns null where no bit edge can be found
 */
export function estimateCn0(prompts: ArrayLike<number>): Estimate | null {
  const found = findBitEdge(prompts, DATA_BIT_MS);
  if (!found) return null;
  const residualHz = residualAt(prompts, found.edge);
  const steady = turnedBack(prompts, residualHz, PROMPT_S);
  return { edge: found.edge, residualHz, cn0DbHz: narrowWide(steady, found.edge) };
}

export const narrowWide = (prompts: ArrayLike<number>, edge: number): number =>
  narrowWideCn0DbHz(prompts, edge, DATA_BIT_MS, PROMPT_S);

const residualAt = (prompts: ArrayLike<number>, edge: number) =>
  bitFrequencyHz(bitSums(prompts, edge, DATA_BIT_MS), BIT_S);

/** The same with bits counted from the first prompt, wherever their edges are. */
export const cutThroughBits = (prompts: ArrayLike<number>, { residualHz }: Estimate): number =>
  narrowWide(turnedBack(prompts, residualHz, PROMPT_S), 0);

/** The same with the residual left in the sums. */
export const residualLeftIn = (prompts: ArrayLike<number>, { edge }: Estimate): number => narrowWide(prompts, edge);

/**
 * Signal from the sums over whole bits, noise from the single prompts about them, its powers averaged as decibels: the
 * mean of the logarithm of an exponential law lies 2.51 dB below the logarithm of its mean (Euler's constant, textbook).
 */
export function noiseAveragedInDb(prompts: ArrayLike<number>, { edge, residualHz }: Estimate): number {
  const steady = turnedBack(prompts, residualHz, PROMPT_S);
  const sums = bitSums(steady, edge, DATA_BIT_MS);
  let [signal, noiseDb, count] = [0, 0, 0];
  for (let bit = 0; bit < sums.length / 2; bit++) {
    const [re, im] = [sums[2 * bit] / DATA_BIT_MS, sums[2 * bit + 1] / DATA_BIT_MS];
    signal += (re * re + im * im) / (sums.length / 2);
    for (let n = edge + bit * DATA_BIT_MS; n < edge + (bit + 1) * DATA_BIT_MS; n++) {
      const [offRe, offIm] = [steady[2 * n] - re, steady[2 * n + 1] - im];
      noiseDb += decibels(offRe * offRe + offIm * offIm);
      count++;
    }
  }
  return decibels(signal) - noiseDb / count - decibels(PROMPT_S);
}
