"use client";
import { useMemo, useState } from "react";
import type { Reading } from "@/components/calculators/reading";
import { LinePlot } from "@/components/plots/LinePlot";
import { Key } from "@/components/ui/Key";
import { formatNumber } from "@/components/ui/formatNumber";

type Traces = { stepNs: number; leadTrace: number[]; endTrace: number[] };
type EchoTracesProps = { data: Traces; onTake?: (reading: Reading) => void };

/** Points on each side of the cursor that the lower plot shows. */
const AROUND = 40;

/** Both traces of a reflectometer over the whole time, and the points around the cursor. */
export function EchoTraces({ data: { stepNs, leadTrace, endTrace }, onTake }: EchoTracesProps) {
  const count = endTrace.length;
  const x = useMemo(() => Float64Array.from({ length: count }, (_, n) => n * stepNs), [count, stepNs]);
  const [point, setPoint] = useState(count >> 1);
  const from = Math.min(Math.max(0, point - AROUND), Math.max(0, count - 2 * AROUND - 1));
  const to = Math.min(count, from + 2 * AROUND + 1);
  const timeNs = point * stepNs;
  const take = () => onTake?.({ timeNs });
  const plot = (first: number, end: number) => {
    const part = { x: x.subarray(first, end), lead: leadTrace.slice(first, end), run: endTrace.slice(first, end) };
    return (
      <LinePlot
        x={{ name: "time, ns", from: part.x[0], to: part.x[part.x.length - 1] }}
        y={{ name: "share of the sent step", from: -0.1, to: 1.1, signed: true }}
        curves={[
          { name: "run connected", role: "subject", x: part.x, y: part.run, nameAt: nameAt(part.x, part.run) },
          {
            name: "test lead alone",
            role: "reference",
            tone: "ink",
            x: part.x,
            y: part.lead,
            nameAt: nameAt(part.x, part.lead),
          },
        ]}
        summary={`Traces from ${formatNumber(part.x[0], 1)} to ${formatNumber(part.x[part.x.length - 1], 1)} ns: test lead alone, dashed, and with the run connected.`}
        cursor={{
          index: point - first,
          onMove: (index) => setPoint(first + index),
          onTake: onTake ? take : undefined,
          lines: (index) => [
            `${formatNumber(part.x[index], 1)} ns`,
            `run ${formatNumber(part.run[index], 3, true)}`,
            `lead ${formatNumber(part.lead[index], 3, true)}`,
          ],
        }}
        columns={[
          { name: "time, ns", values: part.x, decimals: 1 },
          { name: "run connected", values: part.run, decimals: 3, signed: true },
          { name: "test lead alone", values: part.lead, decimals: 3, signed: true },
        ]}
        height={220}
      />
    );
  };
  return (
    <div className="mt-3 grid gap-5">
      <div>
        <h3 className="text-h3">Both traces</h3>
        {plot(0, count)}
      </div>
      <div>
        <h3 className="text-h3">{`Around ${formatNumber(timeNs, 1)} ns`}</h3>
        {plot(from, to)}
      </div>
      {onTake && (
        <Key variant="filled" wide onClick={take}>
          {`Take ${formatNumber(timeNs, 1)} ns`}
        </Key>
      )}
    </div>
  );
}

/** Above the end of a trace, where it is flat. */
const nameAt = (x: Float64Array, y: readonly number[]) => ({
  x: x[x.length - 1],
  y: y[y.length - 1] + 0.04,
  end: true,
});
