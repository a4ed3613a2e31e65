import type { Contender } from "@/tests/bench/bench";
import { median } from "./median";

/** The fastest rounds say what a busy machine hides in the medians. */
const HEADING = ["", "median ms", "ratio", "of the fastest", "target"];

/**
 * Medians and ratios of one bench as a table.
 * @param ours seconds of each contender's rounds, in their order
 * @param theirs seconds of the reference's rounds
 */
export function comparisonRows(
  contenders: readonly Pick<Contender, "name" | "target">[],
  ours: readonly (readonly number[])[],
  theirs: readonly number[],
): string[][] {
  const reference = median(theirs);
  const rows = contenders.map(({ name, target }, n) => {
    const ratio = median(ours[n]) / reference;
    const best = Math.min(...ours[n]) / Math.min(...theirs);
    const verdict = target === null ? "" : ratio <= target ? `within ${target}` : `MISSED ${target}`;
    return [name, milliseconds(median(ours[n])), ratio.toFixed(2), best.toFixed(2), verdict];
  });
  return [HEADING, ["reference", milliseconds(reference), "1.00", "1.00", ""], ...rows];
}

const milliseconds = (seconds: number) => (seconds * 1000).toFixed(seconds < 0.1 ? 2 : 0);
