import { falseAlarmPerCell } from "@/lib/gnss/detection";
import { chiSquareInverseSurvival } from "@/lib/numeric/chiSquare";
import type { Random } from "@/lib/numeric/random";

/**
 * Highest of so many independent cells of noise, mean noise = 1: the level that all of them stay under with a drawn probability.
 * Each is chi-square of 2 * sums degrees: Kaplan & Hegarty, "Understanding GPS", 2nd edition, 5.8.
 */
export function drawNoisePeak(cells: number, sums: number, random: Random): number {
  const exceeded = 1 - random.uniform(); // above 0
  if (exceeded === 1) return 0;
  return chiSquareInverseSurvival(falseAlarmPerCell(exceeded, cells), 2 * sums) / (2 * sums);
}
