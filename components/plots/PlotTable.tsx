"use client";
import { useState } from "react";
import { Key } from "@/components/ui/Key";
import { formatNumber } from "@/components/ui/formatNumber";

export type TableColumn = { name: string; values: ArrayLike<number>; decimals?: number; signed?: boolean };

const ROWS = 200;

/** The data of a plot as a table, two hundred rows at a time. */
export function PlotTable({
  caption,
  columns,
  start = 0,
}: {
  caption: string;
  columns: readonly TableColumn[];
  start?: number;
}) {
  const count = Math.min(...columns.map((column) => column.values.length));
  const [from, setFrom] = useState(Math.floor(start / ROWS) * ROWS);
  const rows = Array.from({ length: Math.max(0, Math.min(ROWS, count - from)) }, (_, at) => from + at);
  return (
    <div className="plot-table" role="region" aria-label={caption} tabIndex={0}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <th key={column.name} scope="col" className="figure">
                {column.name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row}>
              {columns.map((column) => (
                <td key={column.name} className="figure">
                  {formatNumber(column.values[row], column.decimals ?? 2, column.signed)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {count > ROWS && (
        <p className="flex flex-wrap items-center gap-3 p-2 text-label">
          <Key size="tiny" reason={from === 0 ? "first rows" : null} onClick={() => setFrom(from - ROWS)}>
            Rows before
          </Key>
          <Key size="tiny" reason={from + ROWS >= count ? "last rows" : null} onClick={() => setFrom(from + ROWS)}>
            Rows after
          </Key>
          <span className="figures">{`rows ${formatNumber(from + 1)} to ${formatNumber(Math.min(count, from + ROWS))} of ${formatNumber(count)}`}</span>
        </p>
      )}
    </div>
  );
}
