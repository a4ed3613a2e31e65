import { fixOfBearings, type BearingFix, type BearingLine } from "@/lib/gnss/interference/bearingFix";
import { linesOf, type LogRow } from "./patrolLog";

export type FoundFix = BearingFix & { lines: BearingLine[] };

/** The fix of every bearing of a log. */
export const fixWith = (log: readonly LogRow[]): BearingFix | null => fixOfBearings(linesOf(log));

/** The fix with one stop left out. */
export function fixWithout(log: readonly LogRow[], stop: number): FoundFix | null {
  const lines = linesOf(log.filter((row) => row.stop !== stop));
  const fix = fixOfBearings(lines);
  return fix && { ...fix, lines };
}

/** The stop without which the others agree best: a reflection points elsewhere. */
export function findReflection(log: readonly LogRow[]): { stop: number; fix: FoundFix } {
  const tried = linesOf(log).flatMap(({ stop }) => {
    const fix = fixWithout(log, stop);
    return fix ? [{ stop, fix }] : [];
  });
  return tried.reduce((best, one) => (one.fix.sumOfSquares < best.fix.sumOfSquares ? one : best));
}
