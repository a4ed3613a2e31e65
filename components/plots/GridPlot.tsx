"use client";
import { useId, useMemo } from "react";
import { formatNumber } from "@/components/ui/formatNumber";
import { plotGeometry, type Axis, type Margins } from "./geometry";
import { GridCells } from "./GridCells";
import { GridCursorShape } from "./GridCursorShape";
import { HeatScale } from "./HeatScale";
import { NudgeKeys } from "./NudgeKeys";
import { CursorTag } from "./PlotCursor";
import { PlotFrame } from "./PlotFrame";
import { PlotStage } from "./PlotStage";
import { rowCut } from "./gridCuts";
import { useGridCursor, type Cell, type GridCursor } from "./useGridCursor";
import { useWidth } from "./useWidth";

export type GridPlotProps = GridCursor & {
  dopplersHz: Float64Array;
  lagsChips: Float64Array;
  /** Row after row, one row a Doppler; noise is 1. */
  power: Float32Array;
  summary: string;
  /** Reading on the tag; left out, it stands in the cuts beside the grid. */
  lines?: (cell: Cell) => readonly string[];
  /** dB above noise at the dark end of the ramp. */
  topDb?: number;
  height?: number;
  margins?: Margins;
};

const HINTS = [
  { keys: ["←", "→", "↑", "↓"], word: "one cell" },
  { keys: ["Shift"], word: "ten" },
  { keys: ["P"], word: "next peak" },
];
const TAKE = { keys: ["Enter"], word: "take" };

/** Search grid: Doppler up, code phase across, a crosshair that reads one cell of the full grid. */
export function GridPlot({
  dopplersHz,
  lagsChips,
  power,
  summary,
  lines,
  topDb = 10,
  height = 290,
  margins,
  ...cursor
}: GridPlotProps) {
  const [box, width] = useWidth<HTMLDivElement>(640);
  const clipId = useId();
  const { x, y } = useMemo(() => gridAxes(dopplersHz, lagsChips), [dopplersHz, lagsChips]);
  const g = plotGeometry(width, height, x, y, margins);
  const rows = dopplersHz.length;
  const columns = lagsChips.length;
  const cellAt = (px: number, py: number) => ({
    row: Math.round((g.yAt(py) - dopplersHz[0]) / stepOf(dopplersHz)),
    column: Math.round((g.xAt(px) - lagsChips[0]) / stepOf(lagsChips)),
  });
  const grid = useGridCursor(cursor, { power, rows, columns, cellAt });
  const { row, column } = grid.cell;
  const at = { x: g.x(lagsChips[column]), y: g.y(dopplersHz[row]) };
  const shown = lines?.(grid.cell) ?? [];
  return (
    <>
      <PlotStage
        box={box}
        summary={summary}
        reading={`${formatNumber(lagsChips[column], 2)} chip, ${formatNumber(dopplersHz[row], 0, true)} Hz, power ${formatNumber(power[row * columns + column], 2)}, noise 1`}
        cursor="both"
        onCursorKey={grid.onKey}
        onPointer={grid.onPointer}
        table={{
          columns: [
            {
              name: `code phase at ${formatNumber(dopplersHz[row], 0, true)} Hz, chip`,
              values: lagsChips,
              decimals: 2,
            },
            { name: "power, noise = 1", values: rowCut(power, columns, row), decimals: 2 },
          ],
          start: column,
        }}
        hints={cursor.onTake ? [...HINTS, TAKE] : HINTS}
        legend={<HeatScale topDb={topDb} />}
      >
        <GridCells
          power={power}
          columns={columns}
          topDb={topDb}
          place={{ left: g.left, top: g.top, width: g.right - g.left, height: g.bottom - g.top }}
        />
        <div className="relative">
          <PlotFrame geometry={g} x={x} y={y} grid="none" clipId={clipId} over={<GridCursorShape g={g} {...at} />} />
        </div>
        {shown.length > 0 && <CursorTag g={g} x={at.x} y={at.y + 22} lines={shown} />}
      </PlotStage>
      <div className="mt-3 desk:hidden">
        <NudgeKeys onNudge={grid.nudge} onNextPeak={grid.nextPeak} />
      </div>
    </>
  );
}

const stepOf = (values: Float64Array) =>
  values.length > 1 ? (values[values.length - 1] - values[0]) / (values.length - 1) : 1;

/** Axes reach half a cell beyond the outer cells, which are then as wide as the others. */
function gridAxes(dopplersHz: Float64Array, lagsChips: Float64Array): { x: Axis; y: Axis } {
  const half = { x: stepOf(lagsChips) / 2, y: stepOf(dopplersHz) / 2 };
  const last = { x: lagsChips[lagsChips.length - 1], y: dopplersHz[dopplersHz.length - 1] };
  return {
    x: { name: "code phase, chip", from: lagsChips[0] - half.x, to: last.x + half.x },
    y: {
      name: "Doppler, Hz",
      from: dopplersHz[0] - half.y,
      to: last.y + half.y,
      signed: true,
      ticks: quarters(dopplersHz[0], last.y),
    },
  };
}

/** Ends, middle and what lies half way: the Doppler values a search is spoken of by. */
const quarters = (from: number, to: number) =>
  [0, 0.25, 0.5, 0.75, 1].map((part) => Math.round(from + part * (to - from)));
