import { decibels } from "@/lib/numeric/elementary";
import { dopplerPairs } from "./dopplerPairs";
import { exactCorrelation } from "./exactCorrelation";
import type { Chips } from "./shiftRegister";

/** Two codes of a set that are most alike, by their places in it. */
export type WorstPair = {
  a: number;
  b: number;
  lagChips: number;
  /** Chips; without Doppler a whole number. */
  magnitude: number;
  /** How far that lies below a full match. */
  isolationDb: number;
};

/**
 * The largest magnitude that any two codes of a set reach at any lag. The first pair in the set's order, and its first lag,
 * where several reach the same.
 * @param codes at least two, of one length
 * @param kind `periodic`, `flipped` (see `exactCorrelation`) or `either`
 */
export function worstPair(codes: readonly Chips[], kind: "periodic" | "flipped" | "either"): WorstPair {
  const worst = worstOf(codes);
  for (let a = 0; a < codes.length; a++)
    for (let b = a + 1; b < codes.length; b++) {
      const { periodic, flipped } = exactCorrelation(codes[a], codes[b]);
      if (kind !== "flipped") worst.see(a, b, periodic);
      if (kind !== "periodic") worst.see(a, b, flipped);
    }
  return worst.found();
}

/** The same over one period with a Doppler difference, whole multiples of the repetition rate or not. */
export function worstDopplerPair(codes: readonly Chips[], dopplerHz: number, chipRateHz: number): WorstPair {
  const worst = worstOf(codes);
  dopplerPairs(codes, dopplerHz, chipRateHz, worst.see);
  return worst.found();
}

function worstOf(codes: readonly Chips[]) {
  if (codes.length < 2) throw new RangeError(`worstPair: two codes or more, got ${codes.length}`);
  let best = { a: 0, b: 1, lagChips: 0, magnitude: -1 };
  const see = (a: number, b: number, values: ArrayLike<number>) => {
    for (let lagChips = 0; lagChips < values.length; lagChips++)
      if (Math.abs(values[lagChips]) > best.magnitude) best = { a, b, lagChips, magnitude: Math.abs(values[lagChips]) };
  };
  const found = (): WorstPair => ({ ...best, isolationDb: 2 * decibels(codes[0].length / best.magnitude) });
  return { see, found };
}
