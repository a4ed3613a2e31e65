import type { ReactElement, ReactNode } from "react";

export type Standing =
  "valid" | "not-yet-valid" | "suspended" | "withdrawn" | "expired" | "superseded" | "cannot-be-told";

const WORDS: Record<Standing, string> = {
  valid: "Valid",
  "not-yet-valid": "Not yet valid",
  suspended: "Suspended",
  withdrawn: "Withdrawn",
  expired: "Expired",
  superseded: "Superseded",
  "cannot-be-told": "Cannot be told",
};

type Drawing = { height: number; lineTop: number; baseLine: number; block: ReactElement; halo?: boolean };

const hollowBelow = (
  <rect x="4.5" y="9" width="69" height="73.5" fill="none" stroke="var(--minus-deep)" strokeWidth="9" />
);
const aboveTheLine = { height: 94, lineTop: 84.24, baseLine: 79 };

// Units: 104 to the word's font size. The word stands on the line, is crossed by it, or hangs below it.
const drawings: Record<Standing, Drawing> = {
  valid: { ...aboveTheLine, block: <rect y="6.24" width="78" height="78" fill="var(--plus)" /> },
  "not-yet-valid": {
    ...aboveTheLine,
    block: (
      <rect
        x="3.6"
        y="9.84"
        width="70.8"
        height="78"
        fill="none"
        stroke="var(--ink)"
        strokeWidth="7.2"
        strokeDasharray="13 10.4"
      />
    ),
  },
  suspended: { height: 133, lineTop: 84.24, baseLine: 79, halo: true, block: <Astride hatched /> },
  "cannot-be-told": { height: 133, lineTop: 84.24, baseLine: 79, halo: true, block: <Astride /> },
  withdrawn: {
    height: 137,
    lineTop: 39,
    baseLine: 133.8,
    block: (
      <>
        <rect y="48" width="78" height="78" fill="var(--minus)" />
        <path d="M12.48 2.78L65.52 35M65.52 2.78L12.48 35" stroke="var(--minus-deep)" strokeWidth="9" />
      </>
    ),
  },
  expired: { height: 119, lineTop: 0, baseLine: 94.8, block: hollowBelow },
  superseded: { height: 119, lineTop: 0, baseLine: 94.8, block: hollowBelow },
};

/**
 * The status head: once on a page, where reliance is decided. The page's h1 unless `as` says otherwise.
 * @param word another word on the same drawing ("Paid" on that of valid)
 * @param aside stands at the right end, on the line (an amount)
 */
export function StatusHead({ standing, word, aside, as: Tag = "h1", size }: StatusHeadProps) {
  const { height, lineTop, baseLine, block, halo } = drawings[standing];
  const text = word ?? WORDS[standing];
  return (
    <div className="status-head" data-long={text.length > 10 || undefined} data-size={size} data-standing={standing}>
      <span className="status-rule" style={{ top: `${lineTop / 104}em` }} aria-hidden />
      <Tag>
        <span className="sr-only">{text}</span>
        <svg viewBox={`0 0 104 ${height}`} style={{ height: `${height / 104}em` }} aria-hidden>
          {block}
          {halo && <rect y={lineTop} width="78" height="9" fill="var(--ink)" />}
          <text x="103" y={baseLine} {...(halo && { stroke: "var(--sheet)", strokeWidth: 9.36, paintOrder: "stroke" })}>
            {text}
          </text>
        </svg>
      </Tag>
      {aside && (
        <span className="status-aside value" style={{ top: `${lineTop / 104}em` }}>
          <span>{aside}</span>
        </span>
      )}
    </div>
  );
}

type StatusHeadProps = { standing: Standing; word?: string; aside?: ReactNode; as?: "h1" | "h2" | "p"; size?: "small" };

/** Block crossed by the line: hatched when suspended, hollow when the register could not be reached. */
function Astride({ hatched = false }: { hatched?: boolean }) {
  return (
    <>
      <rect
        x="3.6"
        y="49.74"
        width="70.8"
        height="78"
        fill={hatched ? "var(--caution)" : "var(--sheet)"}
        stroke="var(--ink)"
        strokeWidth="7.2"
      />
      {hatched && (
        <path d="M19.5 127.74l17.16 -78M45.24 127.74l17.16 -78" stroke="var(--caution-on)" strokeWidth="7.2" />
      )}
    </>
  );
}
