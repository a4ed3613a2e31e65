import type { PlotGeometry } from "./geometry";

const BOX = 10;

/** Ink line broken round a hollow square, pointer on the axis. */
export function PlotCursor({ g, x, y }: { g: PlotGeometry; x: number; y: number }) {
  const half = BOX / 2;
  const inside = Math.min(g.bottom, Math.max(g.top, y));
  return (
    <g>
      <path
        d={`M${x} ${g.top}V${Math.max(g.top, inside - half)}M${x} ${Math.min(g.bottom, inside + half)}V${g.bottom}`}
        className="plot-cursor"
      />
      <rect x={x - half} y={inside - half} width={BOX} height={BOX} className="plot-cursor-box" />
      <path d={`M${x} ${g.bottom - 5}l5 6h-10z`} fill="var(--cursor)" />
    </g>
  );
}

/** The reading on an ink tag, at the side where there is room. */
export function CursorTag({ g, x, y, lines }: { g: PlotGeometry; x: number; y: number; lines: readonly string[] }) {
  const right = x <= (g.left + g.right) / 2;
  const top = Math.min(Math.max(g.top, y - 6), g.bottom - 18 * lines.length - 12);
  const side = right ? { left: x + 10 } : { right: g.width - x + 10 };
  return (
    <div className="plot-tag" style={{ top, ...side }} aria-hidden>
      {lines.join("\n")}
    </div>
  );
}
