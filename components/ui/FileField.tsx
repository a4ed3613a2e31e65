import { useId, type InputHTMLAttributes } from "react";
import { FieldFrame } from "./FieldFrame";
import { fieldAria, type FieldWords } from "./fieldAria";

/** A file from this device. State size and kinds in `help`, before the person chooses. */
export function FileField({
  label,
  note,
  help,
  error,
  className,
  id,
  ...input
}: Omit<InputHTMLAttributes<HTMLInputElement>, "type" | "size"> & FieldWords) {
  const own = useId();
  const fieldId = id ?? own;
  const words = { label, note, help, error };
  return (
    <FieldFrame id={fieldId} {...words} className={className}>
      <div className="field-box file-box">
        <input {...input} type="file" {...fieldAria(fieldId, words)} />
      </div>
    </FieldFrame>
  );
}
