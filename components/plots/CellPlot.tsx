"use client";
import { useId, useMemo, type ReactNode } from "react";
import { plotGeometry, type Axis, type Margins } from "./geometry";
import { GridCells } from "./GridCells";
import { GridCursorShape } from "./GridCursorShape";
import type { GridOverview } from "./gridOverview";
import type { HeatRamp } from "./heat";
import { HeatScale } from "./HeatScale";
import { CursorTag } from "./PlotCursor";
import { PlotFrame } from "./PlotFrame";
import { PlotStage } from "./PlotStage";
import type { TableColumn } from "./PlotTable";
import { useGridCursor, type Cell, type GridCursor } from "./useGridCursor";
import { useWidth } from "./useWidth";

/** Places of the cells' middles along an axis, evenly spaced, and how the axis is named. */
export type CellAxis = Omit<Axis, "from" | "to"> & { values: Float64Array };

export type CellPlotProps = GridCursor & {
  across: CellAxis;
  up: CellAxis;
  overview: GridOverview;
  ramp: HeatRamp;
  summary: string;
  /** What the crosshair reads, in words. */
  reading: (cell: Cell) => string;
  /** Reading on the tag; left out, it stands beside the plot. */
  lines?: (cell: Cell) => readonly string[];
  /** The row of the crosshair as a table. */
  columns: (cell: Cell) => readonly TableColumn[];
  height?: number;
  margins?: Margins;
  /** At the left under the plot, behind the ramp. */
  note?: ReactNode;
};

const HINTS = [
  { keys: ["\u2190", "\u2192", "\u2191", "\u2193"], word: "one cell" },
  { keys: ["Shift"], word: "ten" },
  { keys: ["P"], word: "next peak" },
];
const TAKE = { keys: ["Enter"], word: "take" };

/** Cells over two axes in the heat ramp, with a crosshair that reads one cell of the full grid. */
export function CellPlot(props: CellPlotProps) {
  const {
    across,
    up,
    overview,
    ramp,
    summary,
    reading,
    lines,
    columns,
    height = 290,
    margins,
    note,
    ...cursor
  } = props;
  const [box, width] = useWidth<HTMLDivElement>(640);
  const clipId = useId();
  const x = useMemo(() => axisOf(across), [across]);
  const y = useMemo(() => axisOf(up), [up]);
  const g = plotGeometry(width, height, x, y, margins);
  const cellAt = (px: number, py: number) => ({
    row: Math.round((g.yAt(py) - up.values[0]) / stepOf(up.values)),
    column: Math.round((g.xAt(px) - across.values[0]) / stepOf(across.values)),
  });
  const size = { rows: up.values.length, columns: across.values.length };
  const grid = useGridCursor(cursor, { peaks: overview.peaks, ...size, cellAt });
  const at = { x: g.x(across.values[grid.cell.column]), y: g.y(up.values[grid.cell.row]) };
  const shown = lines?.(grid.cell) ?? [];
  return (
    <PlotStage
      box={box}
      summary={summary}
      reading={reading(grid.cell)}
      cursor="both"
      onCursorKey={grid.onKey}
      onPointer={grid.onPointer}
      onNudge={grid.nudge}
      onNextPeak={grid.nextPeak}
      table={{ columns: columns(grid.cell), start: grid.cell.column }}
      hints={cursor.onTake ? [...HINTS, TAKE] : HINTS}
      legend={
        <>
          <HeatScale ramp={ramp} />
          {note}
        </>
      }
    >
      <GridCells
        cells={overview.cells}
        ramp={ramp}
        place={{ left: g.left, top: g.top, width: g.right - g.left, height: g.bottom - g.top }}
      />
      <div className="relative">
        <PlotFrame geometry={g} x={x} y={y} grid="none" clipId={clipId} over={<GridCursorShape g={g} {...at} />} />
      </div>
      {shown.length > 0 && <CursorTag g={g} x={at.x} y={at.y + 22} lines={shown} />}
    </PlotStage>
  );
}

const stepOf = (values: Float64Array) =>
  values.length > 1 ? (values[values.length - 1] - values[0]) / (values.length - 1) : 1;

/** An axis reaches half a cell beyond the outer cells, which are then as wide as the others. */
function axisOf({ values, ...axis }: CellAxis): Axis {
  const half = stepOf(values) / 2;
  return { ...axis, from: values[0] - half, to: values[values.length - 1] + half };
}
