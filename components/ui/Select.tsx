import { useId, type SelectHTMLAttributes } from "react";
import { FieldFrame } from "./FieldFrame";
import { fieldAria, type FieldWords } from "./fieldAria";

export type Choice = { value: string; label: string; disabled?: boolean };

type SelectProps = SelectHTMLAttributes<HTMLSelectElement> &
  FieldWords & { choices: readonly Choice[]; empty?: string };

/** One of a list too long for rows. `empty` is the first, unchosen line ("Choose a ground"). */
export function Select({ label, unit, note, help, error, choices, empty, className, id, ...select }: SelectProps) {
  const own = useId();
  const fieldId = id ?? own;
  const words = { label, unit, note, help, error };
  return (
    <FieldFrame id={fieldId} {...words} className={className}>
      <div className="field-box">
        <select {...select} {...fieldAria(fieldId, words)}>
          {empty !== undefined && <option value="">{empty}</option>}
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value} disabled={choice.disabled}>
              {choice.label}
            </option>
          ))}
        </select>
        <svg className="select-arrows" width="14" height="20" viewBox="0 0 14 20" aria-hidden>
          <path d="M2 7.5l5-5 5 5M2 12.5l5 5 5-5" fill="none" stroke="var(--ink)" strokeWidth="2" />
        </svg>
      </div>
    </FieldFrame>
  );
}
