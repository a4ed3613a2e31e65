import { useId } from "react";
import { FieldNotes } from "./FieldFrame";

export type RadioRow = { value: string; label: string; detail?: string; disabled?: boolean };

type RadioRowsProps = {
  name: string;
  legend: string;
  hideLegend?: boolean;
  rows: readonly RadioRow[];
  value?: string | null;
  defaultValue?: string;
  onChange?: (value: string) => void;
  required?: boolean;
  help?: string;
  error?: string | null;
  className?: string;
};

/** A decision: the word, then its consequence in one line; the whole row is the target. */
export function RadioRows({
  name,
  legend,
  hideLegend,
  rows,
  value,
  defaultValue,
  onChange,
  required,
  help,
  error,
  className,
}: RadioRowsProps) {
  const id = useId();
  return (
    <fieldset className={className} aria-describedby={error ? `${id}-error` : help ? `${id}-help` : undefined}>
      <legend className={hideLegend ? "sr-only" : "field-label"}>{legend}</legend>
      <div className="grid gap-2.5">
        {rows.map((row) => (
          <label key={row.value} className="radio-row">
            <input
              type="radio"
              className="radio-dot"
              name={name}
              value={row.value}
              required={required}
              disabled={row.disabled}
              defaultChecked={value === undefined ? row.value === defaultValue : undefined}
              checked={value === undefined ? undefined : row.value === value}
              onChange={onChange ? () => onChange(row.value) : undefined}
              readOnly={value !== undefined && !onChange}
            />
            <span>
              <span className="block text-body font-semibold">{row.label}</span>
              {row.detail && <span className="block text-dense text-ink-2">{row.detail}</span>}
            </span>
          </label>
        ))}
      </div>
      <FieldNotes id={id} help={help} error={error} />
    </fieldset>
  );
}
