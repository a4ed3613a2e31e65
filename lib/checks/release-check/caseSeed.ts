import { seededRandom } from "@/lib/numeric/random";

const WORDS = 8;

/** Seed of one tried case. It follows from the base alone, so that the same plan and engine give the same table. */
export function caseSeed(baseSeedHex: string, n: number, part: "case" | "whole"): string {
  const random = seededRandom(baseSeedHex, `release-check/${part}-${n}`);
  return Array.from({ length: WORDS }, () => random.integer(0, 0xffffffff).toString(16).padStart(8, "0")).join("");
}
