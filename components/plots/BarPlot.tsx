"use client";
import { useId } from "react";
import type { Points } from "./curvePath";
import { plotGeometry, type Axis, type Margins, type PlotGeometry } from "./geometry";
import { CursorTag, PlotCursor } from "./PlotCursor";
import { PlotFrame, type Band, type Limit } from "./PlotFrame";
import { PlotStage } from "./PlotStage";
import { useLineCursor, type LineCursor } from "./useLineCursor";
import { useWidth } from "./useWidth";

export type BarPlotProps = {
  x: Axis;
  y: Axis;
  bars: Points;
  summary: string;
  bands?: readonly Band[];
  limits?: readonly Limit[];
  cursor?: LineCursor & { lines: (index: number) => readonly string[] };
  height?: number;
  margins?: Margins;
};

const BAR = 6;

/** Bins: bars of 6 px from zero, narrower only where they would touch; of bars on one px the highest is drawn. */
export function BarPlot({ x, y, bars, summary, bands, limits, cursor, height = 240, margins }: BarPlotProps) {
  const [box, width] = useWidth<HTMLDivElement>(420);
  const clipId = useId();
  const g = plotGeometry(width, height, x, y, margins);
  const line = useLineCursor(cursor, { x: bars.x, y: bars.y, toPx: g.x });
  const count = Math.min(bars.x.length, bars.y.length);
  const pitch = count > 1 ? Math.abs(g.x(bars.x[1]) - g.x(bars.x[0])) : BAR * 2;
  const bar = Math.max(1, Math.min(BAR, pitch - 1));
  const at = { x: g.x(bars.x[line.index]), y: g.y(bars.y[line.index]) };
  const lines = cursor?.lines(line.index) ?? [];
  return (
    <PlotStage
      box={box}
      summary={summary}
      reading={lines.join(", ")}
      cursor={cursor && "line"}
      onCursorKey={cursor && line.onKey}
      onPointer={cursor && line.onPointer}
      onNudge={line.nudge}
      onNextPeak={line.nextPeak}
      table={{
        columns: [
          { name: x.name, values: bars.x, decimals: x.decimals, signed: x.signed },
          { name: y.name, values: bars.y, decimals: y.decimals, signed: y.signed },
        ],
      }}
    >
      <PlotFrame
        geometry={g}
        x={x}
        y={y}
        grid="y"
        bands={bands}
        limits={limits}
        clipId={clipId}
        over={cursor && <PlotCursor g={g} {...at} />}
      >
        <path d={barsPath(bars, count, pitch, g)} data-bars={count} stroke="var(--plus)" strokeWidth={bar} />
      </PlotFrame>
      {cursor && <CursorTag g={g} {...at} lines={lines} />}
    </PlotStage>
  );
}

/** All bars as one path: a thousand elements would make the page stand still at every move of the cursor. */
function barsPath({ x, y }: Points, count: number, pitchPx: number, g: PlotGeometry): string {
  const foot = Math.min(g.bottom, g.y(0));
  const tops = new Map<number, number>();
  for (let index = 0; index < count; index++) {
    const px = pitchPx < 1 ? Math.round(g.x(x[index])) : g.x(x[index]);
    const top = g.y(y[index]);
    const other = tops.get(px);
    if (other === undefined || Math.abs(top - foot) > Math.abs(other - foot)) tops.set(px, top);
  }
  return Array.from(tops, ([px, top]) => `M${px} ${foot}V${top}`).join("");
}
