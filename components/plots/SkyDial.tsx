import type { ReactNode } from "react";
import { SKY_CENTRE, SKY_SIZE, skyPlace, skyRadius } from "./skyGeometry";

type SkyDialProps = {
  /** One sentence with the finding; the values stand in a table beside it. */
  summary: string;
  /** Drawn below the rings: what hides the sky. */
  under?: ReactNode;
  /** Drawn over them: what stands in the sky. */
  children?: ReactNode;
};

/** The sky with the zenith in the middle and north up. Pure. */
export function SkyDial({ summary, under, children }: SkyDialProps) {
  return (
    <svg
      viewBox={`0 0 ${SKY_SIZE} ${SKY_SIZE}`}
      width={SKY_SIZE}
      className="mt-2 block h-auto max-w-full"
      role="img"
      aria-label={summary}
    >
      {under}
      {[0, 30, 60].map((elevation) => (
        <circle
          key={elevation}
          cx={SKY_CENTRE}
          cy={SKY_CENTRE}
          r={skyRadius(elevation)}
          fill="none"
          stroke={elevation === 0 ? "var(--ink)" : "var(--rule)"}
          strokeWidth={elevation === 0 ? 1.25 : 0.75}
        />
      ))}
      {[30, 60].map((elevation) => (
        <text
          key={elevation}
          x={SKY_CENTRE + 3}
          y={SKY_CENTRE - skyRadius(elevation) + 12}
          fontSize="11"
          fill="var(--ink-3)"
        >
          {elevation}°
        </text>
      ))}
      {(["N", "E", "S", "W"] as const).map((name, quarter) => {
        const [x, y] = skyPlace(quarter * 90, -9);
        return (
          <text key={name} x={x} y={y + 4} fontSize="12" fontWeight="600" textAnchor="middle" fill="var(--ink-2)">
            {name}
          </text>
        );
      })}
      {children}
    </svg>
  );
}
