export type LevelCount = { level: number; count: number };

/** Levels that occur among correlation values and how often, ascending; a Gold family has three of them. */
export function correlationLevels(values: Iterable<number>): LevelCount[] {
  const counts = new Map<number, number>();
  for (const level of values) counts.set(level, (counts.get(level) ?? 0) + 1);
  return [...counts].map(([level, count]) => ({ level, count })).sort((a, b) => a.level - b.level);
}
