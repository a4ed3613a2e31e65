import type { ReactNode } from "react";

type CalculatorFrameProps = {
  /** The deciding figure with its verdict, and the other readings. */
  reading: ReactNode;
  /** The plot that carries it, and what explains it. */
  children: ReactNode;
  /** Fields at the side. */
  fields: ReactNode;
  /** Longer lists below the plot. */
  below?: ReactNode;
  /** Formula, source, numbers put in. */
  working: ReactNode;
  busy?: boolean;
};

/**
 * Where the parts of a calculator stand: on a phone the deciding figure first, then plot, fields, working; with room beside
 * the plot the fields stand at the right and the readings under them.
 */
export function CalculatorFrame({ reading, children, fields, below, working, busy }: CalculatorFrameProps) {
  return (
    <div className="@container">
      <div className="calculator" aria-busy={busy || undefined}>
        <div className="calculator-reading">{reading}</div>
        <div className="calculator-plot">{children}</div>
        <div className="calculator-fields">{fields}</div>
        {below && <div className="calculator-below">{below}</div>}
        <div className="calculator-working">{working}</div>
      </div>
    </div>
  );
}
