"use client";
import { useId } from "react";
import { curvePath, type Points } from "./curvePath";
import { plotGeometry, type Axis, type Margins, type PlotGeometry } from "./geometry";
import { CursorTag, PlotCursor } from "./PlotCursor";
import { PlotFrame, type Band, type Limit } from "./PlotFrame";
import { PlotStage } from "./PlotStage";
import type { TableColumn } from "./PlotTable";
import { useLineCursor, type LineCursor } from "./useLineCursor";
import { useWidth } from "./useWidth";

export type Curve = Points & {
  name: string;
  /** subject 2.5 px, comparison 1.75, reference 1.5 and dashed. */
  role?: "subject" | "comparison" | "reference";
  tone?: "plus" | "minus" | "ink";
  /** Where the name stands, in values of the axes; left out, the curve is not named on the plot. */
  nameAt?: { x: number; y: number; end?: boolean };
};

/** A level that counts at one place only: a short bar, in vermilion when it is not kept. */
export type PlaceMark = { x: number; y: number; kept: boolean };

export type LinePlotProps = {
  x: Axis;
  y: Axis;
  /** At most three; the first is the one the cursor reads. */
  curves: readonly Curve[];
  /** One sentence with the finding. */
  summary: string;
  bands?: readonly Band[];
  limits?: readonly Limit[];
  marks?: readonly PlaceMark[];
  /** Left out, the plot has no cursor. */
  cursor?: LineCursor & { lines: (index: number) => readonly string[] };
  grid?: "both" | "y" | "none";
  height?: number;
  margins?: Margins;
  /** Own columns of the table; left out, x and every curve that shares it. */
  columns?: readonly TableColumn[];
};

const HINTS = [
  { keys: ["←", "→"], word: "one step" },
  { keys: ["Shift"], word: "ten" },
  { keys: ["P"], word: "next peak" },
  { keys: ["T"], word: "table" },
];

/** Up to three curves over one axis, with limits, bands and a cursor that reads the first. */
export function LinePlot({
  x,
  y,
  curves,
  summary,
  bands,
  limits,
  marks = [],
  cursor,
  grid,
  height = 240,
  margins,
  columns,
}: LinePlotProps) {
  const [box, width] = useWidth<HTMLDivElement>(640);
  const clipId = useId();
  const g = plotGeometry(width, height, x, y, margins);
  const [subject] = curves;
  const line = useLineCursor(cursor, { x: subject.x, y: subject.y, toPx: g.x });
  const level = subject.y[line.index];
  const at = { x: g.x(subject.x[line.index]), y: Number.isNaN(level) ? g.bottom : g.y(level) }; // a missing value stands at the foot
  const lines = cursor?.lines(line.index) ?? [];
  const hints = cursor?.onTake ? [...HINTS, { keys: ["Enter"], word: "take" }] : HINTS;
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
      table={{ columns: columns ?? tableColumns(x, y, curves), start: cursor ? line.index : 0 }}
      hints={cursor ? hints : []}
    >
      <PlotFrame
        geometry={g}
        x={x}
        y={y}
        grid={grid}
        bands={bands}
        limits={limits}
        clipId={clipId}
        over={
          <>
            {curves.map((curve) => (
              <CurveName key={curve.name} g={g} curve={curve} />
            ))}
            {cursor && <PlotCursor g={g} {...at} />}
          </>
        }
      >
        {/* The subject is drawn last, over what it is compared with. */}
        {[...curves].reverse().map((curve) => (
          <path key={curve.name} d={curvePath(curve, g)} className="plot-curve" {...strokeOf(curve)} />
        ))}
        {marks.map(({ x: place, y: level, kept }, at) => (
          <path
            key={at}
            data-mark={kept ? "kept" : "passed"}
            d={`M${g.x(place) - 11} ${g.y(level)}h22M${g.x(place) - 11} ${g.y(level)}v-5M${g.x(place) + 11} ${g.y(level)}v-5`}
            className="plot-curve"
            stroke={kept ? "var(--ink)" : "var(--minus-deep)"}
            strokeWidth={kept ? 2 : 3}
          />
        ))}
      </PlotFrame>
      {cursor && <CursorTag g={g} {...at} lines={lines} />}
    </PlotStage>
  );
}

function strokeOf({ role = "comparison", tone = "plus" }: Curve) {
  const width = { subject: 2.5, comparison: 1.75, reference: 1.5 }[role];
  return { stroke: `var(--${tone})`, strokeWidth: width, strokeDasharray: role === "reference" ? "5 4" : undefined };
}

function CurveName({ g, curve }: { g: PlotGeometry; curve: Curve }) {
  if (!curve.nameAt) return null;
  const fill = curve.tone === "ink" ? "var(--ink-2)" : `var(--${curve.tone ?? "plus"}-deep)`;
  return (
    <text
      x={g.x(curve.nameAt.x)}
      y={g.y(curve.nameAt.y)}
      textAnchor={curve.nameAt.end ? "end" : "start"}
      className="plot-curve-name"
      fill={fill}
    >
      {curve.name}
    </text>
  );
}

function tableColumns(x: Axis, y: Axis, curves: readonly Curve[]): TableColumn[] {
  const [subject] = curves;
  const shared = curves.filter((curve) => curve.x === subject.x);
  return [
    { name: x.name, values: subject.x, decimals: x.decimals, signed: x.signed },
    ...shared.map((curve) => ({
      name: shared.length > 1 ? curve.name : y.name,
      values: curve.y,
      decimals: y.decimals,
      signed: y.signed,
    })),
  ];
}
