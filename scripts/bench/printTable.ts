/** Prints rows of cells under a heading, the first column to the left, the others to the right. */
export function printTable(rows: readonly (readonly string[])[], say: (line: string) => void): void {
  const widths = rows[0].map((_, column) => Math.max(...rows.map((row) => row[column].length)));
  const line = (row: readonly string[]) =>
    row.map((cell, column) => (column === 0 ? cell.padEnd(widths[0]) : cell.padStart(widths[column]))).join("  ");
  say(`  ${line(rows[0])}`);
  say(`  ${widths.map((width) => "-".repeat(width)).join("  ")}`);
  for (const row of rows.slice(1)) say(`  ${line(row)}`);
}
