"use client";
import { useMemo } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";

type TimeErrorPlotsProps = {
  /** NaN where a reading is left out. */
  valuesNs: Float64Array;
  intervalS: number;
  limitNs: number;
  index: number;
  onMove: (index: number) => void;
  onTake?: () => void;
};

/** Readings on each side of the cursor that the lower plot shows: half an hour. */
const AROUND = 60;

/** A day of time errors with the limit's two lines, and the hour around the cursor. */
export function TimeErrorPlots({ valuesNs, intervalS, limitNs, index, onMove, onTake }: TimeErrorPlotsProps) {
  const count = valuesNs.length;
  const minutes = useMemo(() => valuesNs.map((_, n) => (n * intervalS) / 60), [valuesNs, intervalS]);
  const reach = useMemo(() => 1.2 * Math.max(limitNs, usualNs(valuesNs)), [valuesNs, limitNs]);
  const from = Math.min(Math.max(0, index - AROUND), Math.max(0, count - 2 * AROUND - 1));
  const to = Math.min(count, from + 2 * AROUND + 1);
  const plot = (first: number, end: number, y: { from: number; to: number }) => {
    const [x, values] = [minutes.subarray(first, end), valuesNs.subarray(first, end)];
    return (
      <LinePlot
        x={{ name: "time, min", from: x[0], to: x[x.length - 1] }}
        y={{ name: "time error, ns", ...y, signed: true }}
        curves={[{ name: "time error", role: "comparison", x, y: values }]}
        bands={[{ y: [-limitNs, limitNs] }]}
        limits={[
          { y: limitNs, name: `+${formatNumber(limitNs)} ns`, tone: "minus" },
          { y: -limitNs, name: `\u2212${formatNumber(limitNs)} ns`, tone: "minus" },
        ]}
        summary={`Readings from ${formatNumber(x[0], 1)} to ${formatNumber(x[x.length - 1], 1)} min, less what was taken off; limit ±${formatNumber(limitNs)} ns.`}
        cursor={{
          index: index - first,
          onMove: (at) => onMove(first + at),
          onTake,
          lines: (at) => [
            `${formatNumber(x[at], 1)} min`,
            Number.isNaN(values[at]) ? "left out" : `${formatNumber(values[at], 1, true)} ns`,
          ],
        }}
        columns={[
          { name: "time, min", values: x, decimals: 1 },
          { name: "time error, ns", values, decimals: 1, signed: true },
        ]}
        height={240}
      />
    );
  };
  const near = valuesNs.subarray(from, to).filter((value) => !Number.isNaN(value));
  const [lowest, highest] = [near.reduce((a, b) => Math.min(a, b), 0), near.reduce((a, b) => Math.max(a, b), 0)];
  return (
    <>
      <div>
        <h3 className="text-h3">The whole day</h3>
        {plot(0, count, { from: -reach, to: reach })}
      </div>
      <div>
        <h3 className="text-h3">{`Around ${formatNumber((index * intervalS) / 60, 1)} min`}</h3>
        {plot(from, to, { from: Math.max(-reach, lowest - 5), to: Math.min(reach, highest + 5) })}
      </div>
    </>
  );
}

/** The magnitude that all but one reading in a hundred keep under: a missed trigger runs out of the plot instead of flattening it. */
function usualNs(valuesNs: Float64Array): number {
  const sorted = valuesNs
    .filter((value) => !Number.isNaN(value))
    .map((value) => Math.abs(value))
    .sort();
  return sorted[Math.floor(0.99 * (sorted.length - 1))] ?? 0;
}
