import type { ReactElement } from "react";

export type GlyphName =
  | "within"
  | "outside"
  | "done"
  | "todo"
  | "awaiting"
  | "valid"
  | "expiring"
  | "suspended"
  | "withdrawn"
  | "expired"
  | "none";

const line = <path d="M0 10h20" stroke="var(--ink)" strokeWidth="2" />;

// Place says it first: above the line holds, astride needs attention, below does not hold.
const drawings: Record<GlyphName, ReactElement> = {
  within: (
    <>
      <rect x="6" y="1" width="8" height="8" fill="var(--plus)" />
      {line}
    </>
  ),
  outside: (
    <>
      <rect x="6" y="11" width="8" height="8" fill="var(--minus)" />
      {line}
    </>
  ),
  done: (
    <>
      <rect x="3" y="1" width="14" height="8" fill="var(--ink)" />
      {line}
    </>
  ),
  todo: (
    <>
      <path d="M0 10h20" stroke="var(--ink-3)" strokeWidth="2" />
      <path d="M3.5 9V5M16.5 9V5" stroke="var(--ink-3)" strokeWidth="1.5" />
    </>
  ),
  awaiting: (
    <>
      <rect
        x="3.75"
        y="1.75"
        width="12.5"
        height="8"
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1.5"
        strokeDasharray="2.5 2"
      />
      {line}
    </>
  ),
  valid: (
    <>
      <rect x="3" y="1" width="14" height="8" fill="var(--plus)" />
      {line}
    </>
  ),
  expiring: (
    <>
      <path d="M3 9V1h7v8zM10 5h7v4h-7z" fill="var(--plus)" />
      {line}
    </>
  ),
  suspended: (
    <>
      <rect x="3.75" y="4.75" width="12.5" height="10.5" fill="var(--caution)" stroke="var(--ink)" strokeWidth="1.5" />
      <path d="M6.5 15l3-10M11 15l3-10" stroke="var(--caution-on)" strokeWidth="1.5" />
      {line}
    </>
  ),
  withdrawn: (
    <>
      <rect x="3" y="11" width="14" height="8" fill="var(--minus)" />
      <path d="M5 1l10 7M15 1l-10 7" stroke="var(--minus-deep)" strokeWidth="2" />
      {line}
    </>
  ),
  expired: (
    <>
      <rect x="3.75" y="11" width="12.5" height="7.25" fill="none" stroke="var(--minus-deep)" strokeWidth="1.5" />
      {line}
    </>
  ),
  none: <path d="M5 10h10" stroke="var(--ink-3)" strokeWidth="2" />,
};

/** A status on the line. A word always stands beside it; give `label` only where that word is elsewhere. */
export function Glyph({
  name,
  size = 20,
  label,
  className,
}: {
  name: GlyphName;
  size?: number;
  label?: string;
  className?: string;
}) {
  const spoken = label ? ({ role: "img", "aria-label": label } as const) : ({ "aria-hidden": true } as const);
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 20 20"
      className={className ?? "inline-block flex-none align-[-0.2em]"}
      {...spoken}
    >
      {drawings[name]}
    </svg>
  );
}
