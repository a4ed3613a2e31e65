import formulas from "./signal-formulas.json";

export type FormulaCase = { name: string; given: Record<string, number>; expected: Record<string, number> };

/** The worked numbers of one formula, by its number in signal-formulas.json. */
export function formulaCases(id: string): FormulaCase[] {
  const row = formulas.rows.find((candidate) => candidate.id === id);
  if (!row) throw new RangeError(`formulaCases: no formula ${id}`);
  return row.cases.map((entry) => ({
    name: `${id} ${JSON.stringify(entry.in)}`,
    given: entry.in as unknown as Record<string, number>,
    expected: entry.out as unknown as Record<string, number>,
  }));
}
