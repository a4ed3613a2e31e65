"use client";
import { useId } from "react";
import type { Points } from "./curvePath";
import { plotGeometry, type Axis } from "./geometry";
import { PlotFrame } from "./PlotFrame";
import { PlotStage } from "./PlotStage";
import type { TableColumn } from "./PlotTable";
import { useWidth } from "./useWidth";

type ScatterPlotProps = {
  /** Both axes have the same scale when their spans are equal. */
  x: Axis;
  y: Axis;
  points: Points;
  /** One sentence with the finding. */
  summary: string;
  columns: readonly TableColumn[];
};

const LARGEST_PX = 420;
const POINT_PX = 4;

/** Points in a square, such as the ends of a signal's vector; read by their pattern, so without a cursor. */
export function ScatterPlot({ x, y, points, summary, columns }: ScatterPlotProps) {
  const [box, width] = useWidth<HTMLDivElement>(360);
  const clipId = useId();
  const side = Math.min(width, LARGEST_PX);
  const g = plotGeometry(side, side, x, y);
  const count = Math.min(points.x.length, points.y.length);
  const dots = Array.from({ length: count }, (_, at) => `M${round(g.x(points.x[at]))} ${round(g.y(points.y[at]))}h0`);
  return (
    <PlotStage box={box} summary={summary} reading="" table={{ columns }}>
      <PlotFrame geometry={g} x={x} y={y} clipId={clipId}>
        <path d={dots.join("")} stroke="var(--plus)" strokeWidth={POINT_PX} strokeLinecap="round" fill="none" />
      </PlotFrame>
    </PlotStage>
  );
}

/** Tenths of a px are below what a point shows. */
const round = (px: number) => Math.round(px * 10) / 10;
