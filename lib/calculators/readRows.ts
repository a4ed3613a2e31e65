import type { Column, Row, RowsInput } from "./calculator";
import { readFigure, type ReadInput } from "./readFigure";

/** Letters that part names and figures, or that a module's text gives a meaning of its own. */
const NAME = /^[^:;,"<>{}\\\n]{1,28}$/;

/** "amplifier: 28, 1.2, -; cable: -9, 9, -": a name and its figures in the order of the columns; left out at the end, the start. */
export function readRows(input: RowsInput, text: string): ReadInput<readonly Row[]> {
  const written = text.split(";").filter((part) => part.trim() !== "");
  if (written.length === 0) return { problem: `Give at least one ${input.row}.` };
  if (written.length > input.most) return { problem: `Give at most ${input.most} ${input.row}s.` };
  const rows: Row[] = [];
  for (const [at, part] of written.entries()) {
    const read = readRow(input, part, at);
    if ("problem" in read) return read;
    rows.push(read.value);
  }
  return { value: rows };
}

function readRow({ row, columns }: RowsInput, text: string, at: number): ReadInput<Row> {
  const parted = text.indexOf(":");
  const name = readRowName(parted < 0 ? `${row} ${at + 1}` : text.slice(0, parted));
  if (name === null) return { problem: `The name of ${row} ${at + 1} is 1 to 28 letters without : ; , or quotes.` };
  const written = text.slice(parted + 1).split(",");
  if (written.length > columns.length)
    return {
      problem: `${name} has ${written.length} figures; a ${row} has ${columns.length}, with a comma between them.`,
    };
  const figures: (number | null)[] = [];
  for (const [index, column] of columns.entries()) {
    const read = readCell(column, written[index]);
    if ("problem" in read) return { problem: `${name}, ${column.label}: ${read.problem}` };
    figures.push(read.value);
  }
  return { value: { name, figures } };
}

/** Null for what cannot be a name. */
export function readRowName(text: string): string | null {
  const name = text.trim().replace(/\s+/g, " ");
  return NAME.test(name) ? name : null;
}

function readCell(column: Column, text: string | undefined): ReadInput<number | null> {
  if (text === undefined || text.trim() === "") return { value: column.start };
  return readFigure(column, column.unit, /^\s*[-\u2212\u2013]\s*$/.test(text) ? "" : text);
}
