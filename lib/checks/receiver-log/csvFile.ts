import { utcOf } from "@/lib/gnss/sky/receiverLog";
import type { CaseFile } from "../kind";

export type Column = { name: string; values: readonly (number | null)[]; decimals: number };

/** Columns of a log, one line a reading with its time; an empty field is a reading that is not there. */
export function csvFile(
  name: string,
  log: { startUnixMs: number; intervalS: number; readings: number },
  columns: readonly Column[],
): CaseFile {
  const lines = Array.from({ length: log.readings }, (_, reading) =>
    [utcOf(log, reading), ...columns.map(({ values, decimals }) => values[reading]?.toFixed(decimals) ?? "")].join(","),
  );
  const text = [["utc", ...columns.map((column) => column.name)].join(","), ...lines, ""].join("\r\n");
  return { name, mediaType: "text/csv", bytes: new TextEncoder().encode(text) };
}
