import { useId, type InputHTMLAttributes, type ReactNode } from "react";
import { FieldNotes } from "./FieldFrame";

type CheckBoxProps = Omit<InputHTMLAttributes<HTMLInputElement>, "type" | "size"> & {
  label: ReactNode;
  help?: string;
  error?: string | null;
};

/** A statement that is made or not made; the words beside it are part of the target. */
export function CheckBox({ label, help, error, className, id, ...input }: CheckBoxProps) {
  const own = useId();
  const fieldId = id ?? own;
  return (
    <div className={className}>
      <label className="tick-row">
        <span className="relative flex-none">
          <input
            {...input}
            id={fieldId}
            type="checkbox"
            className="check-box block"
            aria-invalid={error ? true : undefined}
            aria-describedby={error ? `${fieldId}-error` : help ? `${fieldId}-help` : undefined}
          />
          <svg className="check-mark" viewBox="0 0 24 24" aria-hidden>
            <path d="M7 12.5l3.5 3.5L17 8.5" fill="none" strokeWidth="2.5" />
          </svg>
        </span>
        <span>{label}</span>
      </label>
      <FieldNotes id={fieldId} help={help} error={error} />
    </div>
  );
}
