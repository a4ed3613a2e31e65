"use client";
import { useMemo } from "react";
import { LinePlot, type Curve } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { utcOf } from "@/lib/gnss/sky/receiverLog";
import { timeAxis, timesS, type LogTimes } from "./logAxis";

export type LogColumn = { name: string; values: ArrayLike<number>; tone?: Curve["tone"] };

/** One cursor for every plot of a log: moved on one, it moves on all. */
export type LogCursor = { reading: number; onMove: (reading: number) => void; onTake?: () => void };

type LogSeriesProps = {
  log: LogTimes;
  /** Quantity and unit in words. */
  name: string;
  unit: string;
  decimals: number;
  /** At most three. */
  columns: readonly LogColumn[];
  cursor: LogCursor;
  signed?: boolean;
  /** The axis spans this much at least, so that noise is not drawn as large as an event. */
  leastSpan: number;
  /** More lines for the cursor's tag. */
  more?: (reading: number) => readonly string[];
  height?: number;
};

/** Columns of a log against UTC. */
export function LogSeries({
  log,
  name,
  unit,
  decimals,
  columns,
  cursor,
  signed,
  leastSpan,
  more,
  height,
}: LogSeriesProps) {
  const x = useMemo(() => timesS(log), [log]);
  const curves = columns.map(({ name: curve, values, tone }, n) => ({
    name: curve,
    role: "comparison" as const,
    tone: tone ?? (n === 0 ? ("plus" as const) : n === 1 ? ("minus" as const) : ("ink" as const)),
    x,
    y: values,
  }));
  const text = (value: number) =>
    Number.isFinite(value) ? `${formatNumber(value, decimals, signed)} ${unit}` : "no reading";
  const [only] = columns;
  const span = spanOf(columns, leastSpan);
  return (
    <LinePlot
      x={timeAxis(log)}
      y={{ name, ...span, signed }}
      curves={named(curves, span)}
      summary={`${name} from ${utcOf(log, 0)} to ${utcOf(log, log.readings - 1)} UTC.`}
      cursor={{
        index: cursor.reading,
        onMove: cursor.onMove,
        onTake: cursor.onTake,
        lines: (at) => [
          `${utcOf(log, at)} UTC`,
          ...(columns.length === 1
            ? [text(only.values[at])]
            : columns.map((column) => `${column.name} ${text(column.values[at])}`)),
          ...(more?.(at) ?? []),
        ],
      }}
      columns={[
        { name: `s after ${utcOf(log, 0)}`, values: x.map((seconds) => seconds - x[0]), decimals: 0 },
        ...columns.map((column) => ({
          name: columns.length === 1 ? name : column.name,
          values: column.values,
          decimals,
          signed,
        })),
      ]}
      height={height}
    />
  );
}

/** Where there are several their names stand side by side at the top: curves of noise lie over one another. */
function named(curves: readonly Curve[], { from, to }: { from: number; to: number }): Curve[] {
  if (curves.length === 1) return [...curves];
  return curves.map((curve, n) => {
    const place = Math.floor(((n + 1) / curves.length) * (curve.x.length - 1));
    return { ...curve, nameAt: { x: curve.x[place], y: to - 0.08 * (to - from), end: true } };
  });
}

function spanOf(columns: readonly LogColumn[], leastSpan: number): { from: number; to: number } {
  let [from, to] = [Infinity, -Infinity];
  for (const { values } of columns)
    for (let n = 0; n < values.length; n++) {
      if (!Number.isFinite(values[n])) continue;
      from = Math.min(from, values[n]);
      to = Math.max(to, values[n]);
    }
  if (from > to) return { from: 0, to: leastSpan };
  const room = Math.max(0.06 * (to - from), (leastSpan - (to - from)) / 2);
  return { from: from - room, to: to + room };
}
