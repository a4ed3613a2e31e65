/**
 * A satellite's row in a published table.
 * @throws RangeError when the table has none for it
 */
export function rowOf<T>(table: ReadonlyMap<number, T>, prn: number, title: string): T {
  const row = table.get(prn);
  if (row === undefined) throw new RangeError(`${title}: no published code for satellite ${prn}`);
  return row;
}
