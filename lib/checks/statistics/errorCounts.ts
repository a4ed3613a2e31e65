import type { CountedCase } from "./checkStatistics";

/** Cases in which a quantity was outside with this class of error; null where the marking could name none. */
export type ErrorCount = { quantity: string; errorClass: string | null; cases: number };

/** Most frequent first. */
export function errorCounts(cases: readonly Pick<CountedCase, "outside">[]): ErrorCount[] {
  const counts = new Map<string, ErrorCount>();
  for (const { quantity, errorClass } of cases.flatMap(({ outside }) => outside)) {
    const key = JSON.stringify([quantity, errorClass]);
    const before = counts.get(key)?.cases ?? 0;
    counts.set(key, { quantity, errorClass, cases: before + 1 });
  }
  return [...counts.entries()]
    .sort(([a, one], [b, two]) => two.cases - one.cases || (a < b ? -1 : 1))
    .map(([, count]) => count);
}
