import type { ReactNode } from "react";

type WorkingProps = { label: string; done?: number; total?: number; unit?: string; children?: ReactNode };

/** Waiting: a block on a scale, growing when the length is known, moving when it is not, with count and unit. */
export function Working({ label, done, total, unit, children }: WorkingProps) {
  const known = done !== undefined && total !== undefined && total > 0;
  const part = known ? Math.min(1, done / total) : 0;
  const bar = known ? { "aria-valuenow": done, "aria-valuemin": 0, "aria-valuemax": total } : {};
  return (
    <div className="working">
      <div className="working-line" role="progressbar" aria-label={label} {...bar}>
        <span
          className="working-block"
          data-length={known ? "known" : "unknown"}
          style={known ? { width: `${100 * part}%` } : undefined}
        />
      </div>
      <p className="mt-1 text-dense figures">
        <strong className="font-semibold">{label}</strong>
        {done !== undefined && (
          <span className="text-ink-2">{` ${done}${total !== undefined ? ` of ${total}` : ""}${unit ? ` ${unit}` : ""}`}</span>
        )}
      </p>
      {children && <p className="text-label font-normal text-ink-2">{children}</p>}
    </div>
  );
}
