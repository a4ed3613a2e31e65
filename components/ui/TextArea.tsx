import { useId, type TextareaHTMLAttributes } from "react";
import { FieldFrame } from "./FieldFrame";
import { fieldAria, type FieldWords } from "./fieldAria";

/** Several lines of text. */
export function TextArea({
  label,
  unit,
  note,
  help,
  error,
  className,
  id,
  rows = 4,
  ...area
}: TextareaHTMLAttributes<HTMLTextAreaElement> & FieldWords) {
  const own = useId();
  const fieldId = id ?? own;
  const words = { label, unit, note, help, error };
  return (
    <FieldFrame id={fieldId} {...words} className={className}>
      <div className="field-box">
        <textarea {...area} rows={rows} {...fieldAria(fieldId, words)} />
      </div>
    </FieldFrame>
  );
}
