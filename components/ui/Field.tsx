import { useId, type InputHTMLAttributes, type ReactNode } from "react";
import { classNames } from "./classNames";
import { FieldFrame } from "./FieldFrame";
import { fieldAria, type FieldWords } from "./fieldAria";

export type FieldProps = Omit<InputHTMLAttributes<HTMLInputElement>, "size"> &
  FieldWords & {
    /** `code` for numbers to compare and hexadecimal, `figure` for values (right-aligned). */
    look?: "text" | "code" | "figure";
    /** A small key inside the box, before the unit (paste, scan). */
    inside?: ReactNode;
  };

/** A line of text with its label, unit, help and error. Works without script. */
export function Field({ label, unit, note, help, error, look = "text", inside, className, id, ...input }: FieldProps) {
  const own = useId();
  const fieldId = id ?? own;
  const words = { label, unit, note, help, error };
  return (
    <FieldFrame id={fieldId} {...words} className={className}>
      <div className="field-box">
        <input {...input} {...fieldAria(fieldId, words)} className={classNames(look !== "text" && `${look}-input`)} />
        {inside}
        {unit && (
          <span id={`${fieldId}-unit`} className="field-unit">
            {unit}
          </span>
        )}
      </div>
    </FieldFrame>
  );
}
