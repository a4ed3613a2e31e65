"use client";
import { useMemo, useState } from "react";
import { LinePlot } from "@/components/plots/LinePlot";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import type { Reading } from "./reading";

type TraceReaderProps = { trace: readonly number[]; stepChips: number; onTake?: (reading: Reading) => void };

/** Cells of the whole code that one point of the overview stands for; the strongest of them is kept. */
const MERGED = 8;
const AROUND = 48;

/** A correlator's trace: the whole code above, the cells around the cursor below. */
export function TraceReader({ trace, stepChips, onTake }: TraceReaderProps) {
  const cells = trace.length;
  const [cell, setCell] = useState(cells >> 1);
  const overview = useMemo(() => strongest(trace, stepChips), [trace, stepChips]);
  const top = useMemo(() => trace.reduce((most, value) => Math.max(most, value), 0), [trace]);
  const close = useMemo(() => around(trace, stepChips, cell), [trace, stepChips, cell]);
  const y = { name: "|R|", from: 0, to: top * 1.08 };
  const lag = cell * stepChips;
  const magnitude = trace[cell]!;
  const take = () => onTake?.({ lagChips: lag, magnitude });
  return (
    <div className="grid gap-5">
      <section>
        <h3 className="text-h3">The whole code</h3>
        <LinePlot
          x={{ name: "lag, chip", from: 0, to: cells * stepChips }}
          y={y}
          curves={[{ name: "|R|", role: "subject", x: overview.x, y: overview.y }]}
          columns={columnsOf(overview)}
          summary={`Magnitude of the correlator against lag over ${formatNumber(cells * stepChips)} chip.`}
          cursor={{
            index: Math.floor(cell / MERGED),
            onMove: (index) => setCell(overview.cell[index]!),
            onTake: onTake ? take : undefined,
            lines: (index) => [
              `${formatNumber(overview.cell[index]! * stepChips, 3)} chip`,
              `|R| ${formatNumber(overview.y[index]!, 3)}`,
            ],
          }}
          height={220}
        />
      </section>
      <section>
        <h3 className="text-h3">Around {formatNumber(lag, 3)} chip</h3>
        <LinePlot
          x={{ name: "lag, chip", from: close.x[0]!, to: close.x.at(-1)!, decimals: 1 }}
          y={y}
          curves={[{ name: "|R|", role: "subject", x: close.x, y: close.y }]}
          columns={columnsOf(close)}
          summary={`Cells around ${formatNumber(lag, 3)} chip; |R| is ${formatNumber(magnitude, 3)} there.`}
          cursor={{
            index: close.index,
            onMove: (index) => setCell((cell + index - close.index + cells) % cells),
            onTake: onTake ? take : undefined,
            lines: (index) => [
              `${formatNumber(((cell + index - close.index + cells) % cells) * stepChips, 3)} chip`,
              `|R| ${formatNumber(close.y[index]!, 3)}`,
            ],
          }}
          height={220}
        />
      </section>
      {onTake && (
        <Key variant="filled" wide onClick={take}>
          {`Take ${formatNumber(lag, 3)} chip`}
        </Key>
      )}
    </div>
  );
}

/** The table is for values, the axis for orientation. */
const columnsOf = ({ x, y }: { x: Float64Array; y: Float64Array }) => [
  { name: "lag, chip", values: x, decimals: 3 },
  { name: "|R|", values: y, decimals: 3 },
];

function strongest(trace: readonly number[], stepChips: number) {
  const length = Math.ceil(trace.length / MERGED);
  const cell = Array.from({ length }, (_, group) => {
    let best = group * MERGED;
    for (let n = best; n < Math.min(trace.length, (group + 1) * MERGED); n++) if (trace[n]! > trace[best]!) best = n;
    return best;
  });
  return {
    cell,
    x: Float64Array.from(cell, (at) => at * stepChips),
    y: Float64Array.from(cell, (at) => trace[at]!),
  };
}

/** The cells around one, going round the end of the code. */
function around(trace: readonly number[], stepChips: number, cell: number) {
  const length = 2 * AROUND + 1;
  const at = (n: number) => (cell + n - AROUND + trace.length) % trace.length;
  return {
    x: Float64Array.from({ length }, (_, n) => (cell + n - AROUND) * stepChips),
    y: Float64Array.from({ length }, (_, n) => trace[at(n)]!),
    index: AROUND,
  };
}
