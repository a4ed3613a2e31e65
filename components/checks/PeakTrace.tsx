"use client";
import { useMemo, useState } from "react";
import type { Reading } from "@/components/calculators/reading";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";

/** What the case gives beside its words. */
export type PeakTraceData = { trackedLagChips: number; fromChips: number; stepChips: number; trace: readonly number[] };
type PeakTraceProps = { data: PeakTraceData; onTake?: (reading: Reading) => void };

const AROUND = 30; // points on either side of the cursor in the close view

/** Part of a correlation with the lag that the receiver tracks: all of it above, the points around the cursor below. */
export function PeakTrace({ data, onTake }: PeakTraceProps) {
  const { trackedLagChips, fromChips, stepChips, trace } = data;
  const lags = useMemo(
    () => Float64Array.from(trace, (_, n) => fromChips + n * stepChips),
    [trace, fromChips, stepChips],
  );
  const [point, setPoint] = useState(() => Math.round((trackedLagChips - fromChips) / stepChips));
  const first = Math.min(Math.max(0, point - AROUND), trace.length - 2 * AROUND - 1);
  const close = { x: lags.slice(first, first + 2 * AROUND + 1), y: trace.slice(first, first + 2 * AROUND + 1) };
  const lag = lags[point]!;
  const lines = (at: number) => [`${formatNumber(lags[at]!, 3)} chip`, `|R| ${formatNumber(trace[at]!, 3)}`];
  const take = onTake && (() => onTake({ lagChips: lag, magnitude: trace[point]! }));
  const tracked = { x: trackedLagChips, name: `tracked ${formatNumber(trackedLagChips, 3)}`, tone: "minus" } as const;
  return (
    <div className="grid gap-5">
      <section>
        <h3 className="text-h3">Round the tracked lag</h3>
        <LinePlot
          x={{ name: "lag, chip", from: lags[0]!, to: lags.at(-1)! }}
          y={{ name: "|R|", from: 0, to: highest(trace) * 1.12 }}
          curves={[{ name: "|R|", role: "subject", x: lags, y: trace }]}
          limits={[tracked]}
          columns={columnsOf(lags, trace)}
          summary={`Magnitude of the correlator over ${formatNumber((trace.length - 1) * stepChips, 1)} chip; the receiver tracks ${formatNumber(trackedLagChips, 3)} chip.`}
          cursor={{ index: point, onMove: setPoint, onTake: take, lines }}
          height={260}
        />
      </section>
      <section>
        <h3 className="text-h3">{`Close to ${formatNumber(lag, 3)} chip`}</h3>
        <LinePlot
          x={{ name: "lag, chip", from: close.x[0]!, to: close.x.at(-1)!, decimals: 2 }}
          y={{ name: "|R|", ...aroundOf(close.y) }}
          curves={[{ name: "|R|", role: "subject", ...close }]}
          limits={[tracked]}
          columns={columnsOf(close.x, close.y)}
          summary={`Points close to the cursor; |R| is ${formatNumber(trace[point]!, 3)} at ${formatNumber(lag, 3)} chip.`}
          cursor={{
            index: point - first,
            onMove: (at) => setPoint(first + at),
            onTake: take,
            lines: (at) => lines(first + at),
          }}
          height={220}
        />
      </section>
      {take && (
        <Key variant="filled" wide onClick={take}>
          {`Take ${formatNumber(lag, 3)} chip`}
        </Key>
      )}
    </div>
  );
}

const columnsOf = (lags: ArrayLike<number>, levels: ArrayLike<number>) => [
  { name: "lag, chip", values: lags, decimals: 3 },
  { name: "|R|", values: levels, decimals: 3 },
];

const highest = (values: readonly number[]) => values.reduce((most, value) => Math.max(most, value), 0);

/** The close view fills its height: a flat top is read to one point. */
function aroundOf(values: readonly number[]) {
  const top = highest(values);
  const foot = values.reduce((least, value) => Math.min(least, value), top);
  const room = 0.08 * (top - foot);
  return { from: Math.max(0, foot - room), to: top + room };
}
