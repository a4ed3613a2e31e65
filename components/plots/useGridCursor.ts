"use client";
import { useRef, useState, type KeyboardEvent, type PointerEvent } from "react";

export type Cell = { row: number; column: number };

export type GridCursor = {
  /** Controlled when given. */
  cell?: Cell;
  onMove?: (cell: Cell) => void;
  onTake?: (cell: Cell) => void;
};

type Grid = {
  /** Cells in the order in which P visits them. */
  peaks: readonly number[];
  rows: number;
  columns: number;
  cellAt: (px: number, py: number) => Cell;
};

/** Cursor over a search grid: arrows one cell, Shift ten, P next peak, Home and End along the row, Enter takes. */
export function useGridCursor(cursor: GridCursor, { peaks, rows, columns, cellAt }: Grid) {
  const [own, setOwn] = useState<Cell>({ row: Math.floor(rows / 2), column: Math.floor(columns / 2) });
  const cell = cursor.cell ?? own;
  const drag = useRef<{ px: number; py: number; from: Cell } | null>(null);

  const move = (to: Cell) => {
    const next = {
      row: Math.min(Math.max(0, to.row), rows - 1),
      column: Math.min(Math.max(0, to.column), columns - 1),
    };
    setOwn(next);
    cursor.onMove?.(next);
  };
  const nudge = (across: number, up: number) => move({ row: cell.row + up, column: cell.column + across });
  const nextPeak = () => {
    const here = peaks.indexOf(cell.row * columns + cell.column);
    const to = peaks[(here + 1) % peaks.length];
    if (to !== undefined) move({ row: Math.floor(to / columns), column: to % columns });
  };
  const onKey = (event: KeyboardEvent): boolean => {
    const step = event.shiftKey ? 10 : 1;
    const act = {
      ArrowLeft: () => nudge(-step, 0),
      ArrowRight: () => nudge(step, 0),
      ArrowUp: () => nudge(0, step),
      ArrowDown: () => nudge(0, -step),
      Home: () => move({ ...cell, column: 0 }),
      End: () => move({ ...cell, column: columns - 1 }),
      p: nextPeak,
      P: nextPeak,
      Enter: cursor.onTake && (() => cursor.onTake?.(cell)),
    }[event.key];
    act?.();
    return act !== undefined;
  };
  // A finger moves the cursor by as much as it moves itself, so that it never covers the cell.
  const onPointer = (event: PointerEvent<HTMLDivElement>) => {
    const bounds = event.currentTarget.getBoundingClientRect();
    const px = event.clientX - bounds.left;
    const py = event.clientY - bounds.top;
    if (event.type === "pointerdown" && event.button === 0) {
      event.currentTarget.setPointerCapture?.(event.pointerId);
      const from = event.pointerType === "touch" ? cell : cellAt(px, py);
      if (event.pointerType !== "touch") move(from);
      drag.current = { px, py, from };
    } else if (event.type === "pointermove" && drag.current) {
      const begin = cellAt(drag.current.px, drag.current.py);
      const now = cellAt(px, py);
      move({
        row: drag.current.from.row + now.row - begin.row,
        column: drag.current.from.column + now.column - begin.column,
      });
    } else if (drag.current && event.type !== "pointermove") {
      const still = Math.abs(px - drag.current.px) < 4 && Math.abs(py - drag.current.py) < 4;
      if (event.type === "pointerup" && still) move(cellAt(px, py));
      drag.current = null;
    }
  };
  return { cell, nudge, nextPeak, onKey, onPointer };
}
