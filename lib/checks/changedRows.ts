import type { MarkedRow } from "./kind";

export type ChangedRow = { label: string; before: string | null; now: string | null };

/** Rows of two markings of the same hand-in that do not say the same, each in words; null where a marking has no such row. */
export function changedRows(before: readonly MarkedRow[], now: readonly MarkedRow[]): ChangedRow[] {
  const keys = [...new Set([...before, ...now].map(keyOf))];
  return keys.flatMap((key) => {
    const [old, fresh] = [before, now].map((rows) => rows.find((row) => keyOf(row) === key));
    const change = { label: labelOf((fresh ?? old)!), before: wordsOf(old), now: wordsOf(fresh) };
    return change.before === change.now ? [] : [change];
  });
}

const keyOf = ({ quantity, subject }: MarkedRow): string => JSON.stringify([quantity, subject]);
const labelOf = ({ label, subject }: MarkedRow): string => (subject ? `${subject}, ${label}` : label);

const wordsOf = (row: MarkedRow | undefined): string | null =>
  row ? `${row.within ? "within" : "outside"}, computed ${row.computed}, tolerance ${row.tolerance}` : null;
