import type { ReactNode } from "react";

export type LedgerRow = { label: string; value: ReactNode; detail?: ReactNode };

type LedgerProps = {
  rows: readonly LedgerRow[];
  /** In a side column: label left, value right. */
  narrow?: boolean;
  /** Label, value and detail one under the other, for values that are sentences. */
  stacked?: boolean;
  className?: string;
};

/** Facts of one thing: label, value, and a quieter word at the right. */
export function Ledger({ rows, narrow, stacked, className }: LedgerProps) {
  return (
    <dl className={`ledger ${className ?? ""}`} data-narrow={narrow || undefined} data-stacked={stacked || undefined}>
      {rows.map((row) => (
        <div key={row.label}>
          <dt>{row.label}</dt>
          <dd className="ledger-value figures">{row.value}</dd>
          {row.detail && <dd className="ledger-detail">{row.detail}</dd>}
        </div>
      ))}
    </dl>
  );
}
