"use client";
import { useId } from "react";
import { plotGeometry, type Axis, type Margins, type PlotGeometry } from "./geometry";
import { PlotFrame, type Band, type Limit } from "./PlotFrame";
import { PlotStage } from "./PlotStage";
import { useWidth } from "./useWidth";

export type Stem = { x: number; y: number; within?: boolean; name?: string };

export type StemPlotProps = {
  x: Axis;
  y: Axis;
  stems: readonly Stem[];
  summary: string;
  bands?: readonly Band[];
  limits?: readonly Limit[];
  height?: number;
  margins?: Margins;
};

/** Values as stems from zero: a square within, a cross outside, told apart by shape as well as by colour. */
export function StemPlot({ x, y, stems, summary, bands, limits, height = 240, margins }: StemPlotProps) {
  const [box, width] = useWidth<HTMLDivElement>(640);
  const clipId = useId();
  const g = plotGeometry(width, height, x, y, margins);
  const columns = [
    { name: x.name, values: stems.map((stem) => stem.x), decimals: x.decimals ?? 0, signed: x.signed },
    { name: y.name, values: stems.map((stem) => stem.y), decimals: y.decimals, signed: y.signed },
  ];
  return (
    <PlotStage box={box} summary={summary} reading="" table={{ columns }}>
      <PlotFrame geometry={g} x={x} y={y} grid="y" bands={bands} limits={limits} clipId={clipId}>
        {stems.map((stem, at) => (
          <StemShape key={at} g={g} stem={stem} />
        ))}
      </PlotFrame>
    </PlotStage>
  );
}

function StemShape({ g, stem }: { g: PlotGeometry; stem: Stem }) {
  const x = g.x(stem.x);
  const y = g.y(stem.y);
  const within = stem.within ?? true;
  return (
    <g>
      <path d={`M${x} ${g.y(0)}V${y}`} stroke={within ? "var(--plus)" : "var(--minus)"} strokeWidth="2.5" />
      {within ? (
        <rect data-point="within" x={x - 4.5} y={y - 4.5} width="9" height="9" fill="var(--plus)" />
      ) : (
        <path
          data-point="outside"
          d={`M${x - 5} ${y - 5}l10 10M${x + 5} ${y - 5}l-10 10`}
          stroke="var(--minus-deep)"
          strokeWidth="2.5"
        />
      )}
      {stem.name && (
        <text x={x + 10} y={y + 4} className="plot-curve-name" fill={within ? "var(--plus-deep)" : "var(--minus-deep)"}>
          {stem.name}
        </text>
      )}
    </g>
  );
}
