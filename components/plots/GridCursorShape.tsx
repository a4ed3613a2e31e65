import type { PlotGeometry } from "./geometry";

const BOX = 16;

/** Crosshair broken round a square with a halo of the sheet, so that the cell stays visible. */
export function GridCursorShape({ g, x, y }: { g: PlotGeometry; x: number; y: number }) {
  const half = BOX / 2;
  const lines = `M${g.left} ${y}H${x - half}M${x + half} ${y}H${g.right}M${x} ${g.top}V${y - half}M${x} ${y + half}V${g.bottom}`;
  return (
    <g>
      <path d={`M${g.left} ${g.top}H${g.right}V${g.bottom}`} className="plot-axis" />
      <rect x={x - half} y={y - half} width={BOX} height={BOX} className="plot-cursor-halo" />
      <path d={lines} className="plot-cursor" />
      <rect x={x - half} y={y - half} width={BOX} height={BOX} className="plot-cursor-box" />
    </g>
  );
}
