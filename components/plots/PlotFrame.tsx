import type { ReactNode } from "react";
import { FIGURE_PX, type Axis, type PlotGeometry } from "./geometry";

export type Band = {
  x?: readonly [number, number];
  y?: readonly [number, number];
  name?: string;
  tone?: "plus" | "ink";
};
export type Limit = { y?: number; x?: number; name: string; tone?: "ink" | "minus" | "plus" };

type PlotFrameProps = {
  geometry: PlotGeometry;
  x: Axis;
  y: Axis;
  grid?: "both" | "y" | "none";
  bands?: readonly Band[];
  limits?: readonly Limit[];
  /** Drawn between the grid and the axes, cut at the edges. */
  children?: ReactNode;
  /** Drawn last and not cut: names on curves, cursor. */
  over?: ReactNode;
  clipId: string;
};

/** Axes, grid, bands and limits of a plot. Pure: everything comes from the geometry. */
export function PlotFrame({
  geometry: g,
  x,
  y,
  grid = "both",
  bands = [],
  limits = [],
  children,
  over,
  clipId,
}: PlotFrameProps) {
  return (
    <svg width={g.width} height={g.height} className="plot-svg" aria-hidden>
      <clipPath id={clipId}>
        <rect
          x={g.left}
          y={g.top - 1}
          width={Math.max(0, g.right - g.left)}
          height={Math.max(0, g.bottom - g.top + 2)}
        />
      </clipPath>
      {/* Without lines the frame lies over a picture, which a ground would hide. */}
      {grid !== "none" && (
        <rect
          x={g.left}
          y={g.top}
          width={Math.max(0, g.right - g.left)}
          height={g.bottom - g.top}
          className="plot-ground"
        />
      )}
      <Grid g={g} grid={grid} />
      {bands.map((band, at) => (
        <BandShape key={at} g={g} band={band} />
      ))}
      {/* An axis with words of its own, such as powers of ten, has no zero. */}
      {grid !== "none" && !y.text && y.from < 0 && y.to > 0 && (
        <path d={`M${g.left} ${g.y(0)}H${g.right}`} className="plot-zero" />
      )}
      <g clipPath={`url(#${clipId})`}>{children}</g>
      {limits.map((limit) => (
        <LimitLine key={limit.name} g={g} limit={limit} />
      ))}
      <Axes g={g} x={x} y={y} />
      {over}
    </svg>
  );
}

function Grid({ g, grid }: { g: PlotGeometry; grid: "both" | "y" | "none" }) {
  if (grid === "none") return null;
  const across = g.yTicks.major.map((value) => `M${g.left} ${g.y(value)}H${g.right}`).join("");
  const upright = grid === "both" ? g.xTicks.major.map((value) => `M${g.x(value)} ${g.top}V${g.bottom}`).join("") : "";
  return <path d={across + upright} className="plot-grid" />;
}

/** Axes in ink, ticks outside 6 and 3, names at the end of x and above y, never turned. */
function Axes({ g, x, y }: { g: PlotGeometry; x: Axis; y: Axis }) {
  const ticks = [
    ...g.xTicks.major.map((value) => `M${g.x(value)} ${g.bottom}v6`),
    ...g.xTicks.minor.map((value) => `M${g.x(value)} ${g.bottom}v3`),
    ...g.yTicks.major.map((value) => `M${g.left} ${g.y(value)}h-6`),
  ].join("");
  return (
    <>
      <path d={`M${g.left} ${g.top}V${g.bottom}H${g.right}${ticks}`} className="plot-axis" />
      {g.xTicks.major.map((value) => (
        <text
          key={value}
          x={inside(g.x(value), g.xLabel(value), g.width)}
          y={g.bottom + 19}
          className="plot-tick"
          textAnchor="middle"
        >
          {g.xLabel(value)}
        </text>
      ))}
      {g.yTicks.major.map((value) => (
        <text key={value} x={g.left - 9} y={g.y(value) + 4} className="plot-tick" textAnchor="end">
          {g.yLabel(value)}
        </text>
      ))}
      <text x={g.right} y={g.bottom + 36} className="plot-axis-name" textAnchor="end">
        {x.name}
      </text>
      <text x={0} y={13} className="plot-axis-name">
        {y.name}
      </text>
    </>
  );
}

/** Keeps a centred label within the drawing. */
function inside(px: number, label: string, width: number): number {
  const half = (label.length * FIGURE_PX) / 2;
  return Math.max(half, Math.min(px, width - half));
}

function BandShape({ g, band }: { g: PlotGeometry; band: Band }) {
  const inX = (px: number) => Math.min(g.right, Math.max(g.left, px));
  const inY = (px: number) => Math.min(g.bottom, Math.max(g.top, px));
  const [left, right] = band.x ? [inX(g.x(band.x[0])), inX(g.x(band.x[1]))] : [g.left, g.right];
  const [top, bottom] = band.y ? [inY(g.y(band.y[1])), inY(g.y(band.y[0]))] : [g.top, g.bottom];
  const edges = band.x
    ? `M${left} ${top}V${bottom}M${right} ${top}V${bottom}`
    : `M${left} ${top}H${right}M${left} ${bottom}H${right}`;
  const ink = band.tone === "ink";
  return (
    <>
      <rect
        x={left}
        y={top}
        width={Math.max(0, right - left)}
        height={Math.max(0, bottom - top)}
        fill={ink ? "var(--ink)" : "var(--plus)"}
        opacity="var(--band-o)"
      />
      {!ink && <path d={edges} className="plot-band-edge" />}
      {band.name && (
        <text
          x={band.x ? left - 6 : right - 4}
          y={band.x ? bottom - 6 : top - 5}
          textAnchor="end"
          className="plot-note"
        >
          {band.name}
        </text>
      )}
    </>
  );
}

function LimitLine({ g, limit }: { g: PlotGeometry; limit: Limit }) {
  const colour =
    limit.tone === "minus" ? "var(--minus-deep)" : limit.tone === "plus" ? "var(--plus-deep)" : "var(--ink)";
  const upright = limit.x !== undefined;
  const at = upright ? g.x(limit.x ?? 0) : g.y(limit.y ?? 0);
  if (upright ? at < g.left || at > g.right : at < g.top || at > g.bottom) return null;
  const right = upright && at > (g.left + g.right) / 2;
  return (
    <>
      <path
        d={upright ? `M${at} ${g.top}V${g.bottom}` : `M${g.left} ${at}H${g.right}`}
        className="plot-limit"
        stroke={colour}
      />
      <text
        x={upright ? at + (right ? -6 : 6) : g.right - 4}
        y={upright ? g.top + 12 : at - 6}
        textAnchor={upright && !right ? "start" : "end"}
        className="plot-note"
        style={{ fill: colour }}
      >
        {limit.name}
      </text>
    </>
  );
}
