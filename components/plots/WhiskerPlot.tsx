"use client";
import { useId } from "react";
import { plotGeometry, type Axis, type PlotGeometry } from "./geometry";
import { CursorTag, PlotCursor } from "./PlotCursor";
import { PlotFrame, type Limit } from "./PlotFrame";
import { PlotStage } from "./PlotStage";
import type { TableColumn } from "./PlotTable";
import { useLineCursor, type LineCursor } from "./useLineCursor";
import { useWidth } from "./useWidth";

export type WhiskerBar = {
  name: string;
  value: number;
  /** Half of the whisker. */
  uncertainty: number;
  /** A sum stands in ink. */
  sum?: boolean;
};

type WhiskerPlotProps = {
  y: Axis;
  bars: readonly WhiskerBar[];
  summary: string;
  limits?: readonly Limit[];
  cursor: LineCursor & { lines: (index: number) => readonly string[] };
  columns: readonly TableColumn[];
  height?: number;
};

const HINTS = [
  { keys: ["←", "→"], word: "one bar" },
  { keys: ["T"], word: "table" },
];

/** Values as bars from zero, each with its uncertainty: above the line blue, below it vermilion, a sum in ink. */
export function WhiskerPlot({ y, bars, summary, limits, cursor, columns, height = 300 }: WhiskerPlotProps) {
  const [box, width] = useWidth<HTMLDivElement>(640);
  const clipId = useId();
  const places = bars.map((_, at) => at + 1);
  const x: Axis = {
    name: "part",
    from: 0.4,
    to: bars.length + 0.6,
    ticks: places,
    text: (place) => (bars.length <= 7 ? bars[place - 1].name : `${place}`),
  };
  const g = plotGeometry(width, height, x, y);
  const values = bars.map(({ value }) => value);
  const line = useLineCursor(cursor, { x: places, y: values, toPx: g.x });
  const lines = cursor.lines(line.index);
  const at = { x: g.x(places[line.index]), y: g.y(values[line.index]) };
  return (
    <PlotStage
      box={box}
      summary={summary}
      reading={lines.join(", ")}
      cursor="line"
      onCursorKey={line.onKey}
      onPointer={line.onPointer}
      onNudge={line.nudge}
      table={{ columns, start: line.index }}
      hints={HINTS}
    >
      <PlotFrame geometry={g} x={x} y={y} grid="y" limits={limits} clipId={clipId} over={<PlotCursor g={g} {...at} />}>
        {bars.map((bar, index) => (
          <BarShape key={index} g={g} at={index + 1} bar={bar} />
        ))}
      </PlotFrame>
      <CursorTag g={g} {...at} lines={lines} />
    </PlotStage>
  );
}

function BarShape({ g, at, bar }: { g: PlotGeometry; at: number; bar: WhiskerBar }) {
  const half = Math.min(22, Math.abs(g.x(1) - g.x(0)) * 0.32);
  const x = g.x(at);
  const [zero, top] = [g.y(0), g.y(bar.value)];
  const [low, high] = [g.y(bar.value - bar.uncertainty), g.y(bar.value + bar.uncertainty)];
  const fill = bar.sum ? "var(--ink-3)" : bar.value < 0 ? "var(--minus)" : "var(--plus)";
  return (
    <g>
      <rect x={x - half} y={Math.min(zero, top)} width={2 * half} height={Math.abs(top - zero)} fill={fill} />
      <path d={`M${x} ${high}V${low}M${x - 7} ${high}h14M${x - 7} ${low}h14`} stroke="var(--sheet)" strokeWidth="5" />
      <path d={`M${x} ${high}V${low}M${x - 7} ${high}h14M${x - 7} ${low}h14`} stroke="var(--ink)" strokeWidth="2" />
    </g>
  );
}
