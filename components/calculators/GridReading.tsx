"use client";
import { useState } from "react";
import { BarPlot } from "@/components/plots/BarPlot";
import { columnCut, rowCut } from "@/components/plots/gridCuts";
import { GridPlot } from "@/components/plots/GridPlot";
import { LinePlot } from "@/components/plots/LinePlot";
import type { Cell } from "@/components/plots/useGridCursor";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import type { Reading } from "./reading";
import type { SearchResult } from "./useSearch";

type GridReadingProps = { result: SearchResult; onTake?: (reading: Reading) => void; busy: boolean; start?: Cell };

/** Lags either side of the crosshair that the cut shows; half a chip apart. */
const CUT_CELLS = 20;

/**
 * Grid, crosshair, cuts and the key that takes the crosshair's reading. Without a `start` the crosshair begins in the middle of
 * the window: in a case the strongest cell is for the person to find.
 */
export function GridReading({ result, onTake, busy, start }: GridReadingProps) {
  const { prn, settings, grid } = result;
  const columns = grid.lagsChips.length;
  const top = grid.power[grid.overview.peaks[0]!]!;
  const [moved, setMoved] = useState<{ of: SearchResult; cell: Cell } | null>(null);
  const cell =
    moved?.of === result ? moved.cell : (start ?? { row: grid.dopplersHz.length >> 1, column: columns >> 1 });
  const setCell = (next: Cell) => setMoved({ of: result, cell: next });

  const power = grid.power[cell.row * columns + cell.column]!;
  const lag = grid.lagsChips[cell.column]!;
  const doppler = grid.dopplersHz[cell.row]!;
  const cn0DbHz = 10 * Math.log10(Math.max(1e-3, power - 1) * (1000 / settings.coherentMs));
  const take = () => onTake?.({ prn, codePhaseChips: lag, dopplerHz: doppler, cn0DbHz, binHz: settings.dopplerStepHz });

  const byLag = lagCut(grid.lagsChips, rowCut(grid.power, columns, cell.row), cell.column);
  const byDoppler = columnCut(grid.power, columns, cell.column);
  const height = Math.max(2 * grid.threshold, 1.1 * power, 1.1 * Math.max(...byDoppler));
  const threshold = [{ y: grid.threshold, name: `threshold ${formatNumber(grid.threshold, 2)}` }];
  return (
    <div className="grid gap-4" aria-busy={busy}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
        <h3 className="text-h3">Search grid, satellite {prn}</h3>
        <p className="text-label font-normal text-ink-2 figures">
          {settings.sums} × {settings.coherentMs} ms, step {formatNumber(settings.dopplerStepHz)} Hz, 0.5 chip. Highest
          cell {formatNumber(top, 2)}, threshold {formatNumber(grid.threshold, 2)}
        </p>
      </div>
      <GridPlot
        dopplersHz={grid.dopplersHz}
        lagsChips={grid.lagsChips}
        power={grid.power}
        overview={grid.overview}
        cell={cell}
        onMove={setCell}
        onTake={onTake ? take : undefined}
        summary={`Search grid of satellite ${prn}: highest cell ${formatNumber(top, 2)} times the noise, threshold ${formatNumber(grid.threshold, 2)}.`}
      />
      <div className="grid gap-5 tablet:grid-cols-[3fr_2fr]">
        <section>
          <h4 className="text-dense font-semibold figures">Cut at {formatNumber(doppler, 0, true)} Hz</h4>
          <LinePlot
            x={{ name: "code phase, chip", from: byLag.x[0]!, to: byLag.x.at(-1)!, decimals: 1 }}
            y={{ name: "power, noise = 1", from: 0, to: height, decimals: 1 }}
            curves={[{ name: "power", role: "subject", x: byLag.x, y: byLag.y }]}
            limits={threshold}
            summary={`Power at ${formatNumber(doppler, 0, true)} Hz against code phase; ${formatNumber(power, 2)} at ${formatNumber(lag, 2)} chip.`}
            cursor={{
              index: byLag.index,
              onMove: (index) => setCell({ ...cell, column: (cell.column + index - byLag.index + columns) % columns }),
              onTake: onTake ? take : undefined,
              lines: (index) => [
                `${formatNumber(wrapped(byLag.x[index]!), 2)} chip`,
                `power ${formatNumber(byLag.y[index]!, 2)}`,
              ],
            }}
            height={200}
          />
        </section>
        <section>
          <h4 className="text-dense font-semibold figures">Cut at {formatNumber(lag, 2)} chip</h4>
          <BarPlot
            x={{ name: "Doppler, Hz", from: grid.dopplersHz[0]!, to: grid.dopplersHz.at(-1)!, signed: true }}
            y={{ name: "power, noise = 1", from: 0, to: height, decimals: 1 }}
            bars={{ x: grid.dopplersHz, y: byDoppler }}
            limits={threshold}
            summary={`Power at ${formatNumber(lag, 2)} chip against Doppler.`}
            cursor={{
              index: cell.row,
              onMove: (row) => setCell({ ...cell, row }),
              onTake: onTake ? take : undefined,
              lines: (row) => [`${formatNumber(grid.dopplersHz[row]!, 0, true)} Hz`],
            }}
            height={200}
          />
        </section>
      </div>
      <p className="text-dense figures">
        At the crosshair: {formatNumber(lag, 2)} chip, {formatNumber(doppler, 0, true)} Hz, power{" "}
        {formatNumber(power, 2)}, C/N<sub>0</sub> {power > 1 ? formatNumber(cn0DbHz, 1) : "–"} dB-Hz as the cell stands.
      </p>
      {onTake && (
        <Key variant="filled" wide onClick={take}>
          {`Take ${formatNumber(lag, 2)} chip, ${formatNumber(doppler, 0, true)} Hz for satellite ${prn}`}
        </Key>
      )}
    </div>
  );
}

/** The row around a column, going round the end of the code. */
function lagCut(lags: Float64Array, row: Float32Array, column: number) {
  const step = lags[1]! - lags[0]!;
  const length = 2 * CUT_CELLS + 1;
  const x = Float64Array.from({ length }, (_, n) => lags[column]! + (n - CUT_CELLS) * step);
  const y = Float32Array.from({ length }, (_, n) => row[(column + n - CUT_CELLS + row.length) % row.length]!);
  return { x, y, index: CUT_CELLS };
}

const CODE_CHIPS = 1023;
const wrapped = (lag: number) => ((lag % CODE_CHIPS) + CODE_CHIPS) % CODE_CHIPS;
