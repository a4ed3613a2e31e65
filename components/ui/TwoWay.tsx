import { useId } from "react";
import { FieldNotes } from "./FieldFrame";
import type { Choice } from "./Select";

type TwoWayProps = {
  name: string;
  /** Said to a screen reader, and shown above when `showLabel`. */
  label: string;
  showLabel?: boolean;
  choices: readonly Choice[];
  value?: string | null;
  defaultValue?: string;
  onChange?: (value: string) => void;
  help?: string;
  error?: string | null;
  required?: boolean;
  disabled?: boolean;
  className?: string;
};

/** Two words (or a few) of equal standing, both always visible; nothing is chosen until somebody chooses. */
export function TwoWay({
  name,
  label,
  showLabel,
  choices,
  value,
  defaultValue,
  onChange,
  help,
  error,
  required,
  disabled,
  className,
}: TwoWayProps) {
  const id = useId();
  return (
    <fieldset
      className={className}
      disabled={disabled}
      aria-describedby={error ? `${id}-error` : help ? `${id}-help` : undefined}
    >
      <legend className={showLabel ? "field-label" : "sr-only"}>{label}</legend>
      <div className="two-way">
        {choices.map((choice) => (
          <label key={choice.value}>
            <input
              type="radio"
              name={name}
              value={choice.value}
              required={required}
              disabled={choice.disabled}
              defaultChecked={value === undefined ? choice.value === defaultValue : undefined}
              checked={value === undefined ? undefined : choice.value === value}
              onChange={onChange ? () => onChange(choice.value) : undefined}
              readOnly={value !== undefined && !onChange}
            />
            <span className="two-way-word" data-word={choice.label}>
              {choice.label}
            </span>
          </label>
        ))}
      </div>
      <FieldNotes id={id} help={help} error={error} />
    </fieldset>
  );
}
