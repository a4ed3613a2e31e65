"use client";
import { useId, useRef, type InputHTMLAttributes } from "react";
import { FieldFrame } from "./FieldFrame";
import { fieldAria, type FieldWords } from "./fieldAria";

export type NumberFieldProps = Omit<
  InputHTMLAttributes<HTMLInputElement>,
  "onChange" | "value" | "defaultValue" | "type" | "size"
> &
  FieldWords & {
    value?: string;
    defaultValue?: string;
    onChange?: (text: string) => void;
    /** Called with the text when the field is left: the place to check. Return the normal form to show it. */
    onLeave?: (text: string) => string | void;
    /** The sign matters: a key that turns it stands at the left, for keyboards without a minus. */
    signed?: boolean;
  };

/** A figure with its unit. The text is kept as typed; what it means is decided by the caller, when the field is left. */
export function NumberField({
  label,
  unit,
  note,
  help,
  error,
  signed,
  value,
  onChange,
  onLeave,
  onBlur,
  className,
  id,
  ...input
}: NumberFieldProps) {
  const own = useId();
  const box = useRef<HTMLInputElement>(null);
  const fieldId = id ?? own;
  const words = { label, unit, note, help, error };

  const show = (text: string) => {
    if (value === undefined && box.current) box.current.value = text;
    onChange?.(text);
  };
  return (
    <FieldFrame id={fieldId} {...words} className={className}>
      <div className="field-box">
        {signed && (
          <button
            type="button"
            className="field-sign"
            aria-label={`Turn the sign of ${label}`}
            onClick={() => show(turnedSign(box.current?.value ?? ""))}
          >
            ±
          </button>
        )}
        <input
          placeholder="–"
          inputMode="decimal"
          autoComplete="off"
          {...input}
          {...fieldAria(fieldId, words)}
          ref={box}
          type="text"
          className="figure-input"
          value={value}
          onChange={(event) => onChange?.(event.target.value)}
          onBlur={(event) => {
            const normal = onLeave?.(event.target.value);
            if (typeof normal === "string" && normal !== event.target.value) show(normal);
            onBlur?.(event);
          }}
        />
        {unit && (
          <span id={`${fieldId}-unit`} className="field-unit">
            {unit}
          </span>
        )}
      </div>
    </FieldFrame>
  );
}

/** Plus becomes minus and minus plus; an ordinary hyphen counts as a minus. */
export function turnedSign(text: string): string {
  const bare = text.trim().replace(/^[+\-\u2212]/, "");
  return /^[-\u2212]/.test(text.trim()) ? `+${bare}` : `\u2212${bare}`;
}
