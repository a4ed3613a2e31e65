import { curvePath } from "@/components/plots/curvePath";
import type { CalculatorTag } from "@/lib/calculators/calculators";
import { smallCurve } from "./smallCurves";

const WIDTH = 92;
const HEIGHT = 40;
const EDGE = 3;

/** A calculator in miniature: the curve it draws with its own start values, over its line. */
export function SmallCurve({ tag }: { tag: CalculatorTag }) {
  const { x, y, bars } = smallCurve(tag);
  const [low, high] = [Math.min(0, ...y), Math.max(0, ...y)];
  const first = x[0];
  const toX = (value: number) => EDGE + ((value - first) / (x[x.length - 1] - first)) * (WIDTH - 2 * EDGE);
  const toY = (value: number) => EDGE + ((high - value) / (high - low)) * (HEIGHT - 2 * EDGE);
  const bar = (WIDTH - 2 * EDGE) / x.length - 1;
  return (
    <svg width={WIDTH} height={HEIGHT} viewBox={`0 0 ${WIDTH} ${HEIGHT}`} aria-hidden>
      <path d={`M0 ${toY(0)}H${WIDTH}`} stroke="var(--ink-3)" strokeWidth="1" />
      {bars ? (
        y.map((value, at) => (
          <rect
            key={at}
            x={EDGE + at * (bar + 1)}
            y={Math.min(toY(value), toY(0))}
            width={bar}
            height={Math.abs(toY(value) - toY(0))}
            fill={value < 0 ? "var(--minus)" : "var(--plus)"}
          />
        ))
      ) : (
        <path
          d={curvePath({ x, y }, { x: toX, y: toY, left: 0, right: WIDTH })}
          fill="none"
          stroke="var(--plus)"
          strokeWidth="1.75"
        />
      )}
    </svg>
  );
}
