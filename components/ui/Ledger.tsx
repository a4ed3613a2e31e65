import type { ReactNode } from "react";

export type LedgerRow = { label: string; value: ReactNode; detail?: ReactNode };

/** Facts of one thing: label, value, and a quieter word at the right. `narrow` for side columns. */
export function Ledger({
  rows,
  narrow,
  className,
}: {
  rows: readonly LedgerRow[];
  narrow?: boolean;
  className?: string;
}) {
  return (
    <dl className={`ledger ${className ?? ""}`} data-narrow={narrow || undefined}>
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
