import type { ReactNode } from "react";

type CalculatorFrameProps = {
  /** The verdict and the figure that decides. */
  reading: ReactNode;
  /** The plot that carries it. */
  children: ReactNode;
  fields: ReactNode;
  /** The other readings. */
  more?: ReactNode;
  /** Longer lists of inputs, which need the width of the plot. */
  below?: ReactNode;
  /** Formula, source, numbers put in. */
  working: ReactNode;
  busy?: boolean;
};

/**
 * Where the parts of a calculator stand. On a phone one under the other: deciding figure, plot, fields, other readings,
 * lists, working. With room beside the plot: fields and readings in a column at its right.
 */
export function CalculatorFrame({ reading, children, fields, more, below, working, busy }: CalculatorFrameProps) {
  return (
    <div className="@container">
      <div className="calculator" aria-busy={busy || undefined}>
        <div className="calculator-side">
          <div className="calculator-reading">{reading}</div>
          <div className="calculator-fields">{fields}</div>
          {more && <div className="calculator-more">{more}</div>}
        </div>
        <div className="calculator-main">
          <div className="calculator-plot">{children}</div>
          {below && <div className="calculator-below">{below}</div>}
          <div className="calculator-working">{working}</div>
        </div>
      </div>
    </div>
  );
}
