"use client";
import { useId } from "react";
import type { Points } from "./curvePath";
import { plotGeometry, type Axis, type Margins } from "./geometry";
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

/** Bins: bars of 6 px from zero, narrower only where they would touch. */
export function BarPlot({ x, y, bars, summary, bands, limits, cursor, height = 240, margins }: BarPlotProps) {
  const [box, width] = useWidth<HTMLDivElement>(420);
  const clipId = useId();
  const g = plotGeometry(width, height, x, y, margins);
  const line = useLineCursor(cursor, { x: bars.x, y: bars.y, toPx: g.x });
  const count = Math.min(bars.x.length, bars.y.length);
  const pitch = count > 1 ? Math.abs(g.x(bars.x[1]) - g.x(bars.x[0])) : BAR * 2;
  const bar = Math.max(1, Math.min(BAR, pitch - 1));
  const foot = g.y(Math.max(y.from, 0));
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
        {Array.from({ length: count }, (_, index) => {
          const top = g.y(bars.y[index]);
          return (
            <rect
              key={index}
              x={g.x(bars.x[index]) - bar / 2}
              y={Math.min(top, foot)}
              width={bar}
              height={Math.abs(top - foot)}
              fill="var(--plus)"
            />
          );
        })}
      </PlotFrame>
      {cursor && <CursorTag g={g} {...at} lines={lines} />}
    </PlotStage>
  );
}
