import type { ReactNode } from "react";
import { Glyph } from "./Glyph";
import type { FieldWords } from "./fieldAria";

/** Label above, help that stays when an error appears, error below the line. Shared by every kind of field. */
export function FieldFrame({
  id,
  label,
  note,
  help,
  error,
  className,
  children,
}: FieldWords & { id: string; className?: string; children: ReactNode }) {
  return (
    <div className={className}>
      <label htmlFor={id} id={`${id}-label`} className="field-label">
        {label}
        {note && <span className="ml-2 text-label text-ink-2">{note}</span>}
      </label>
      {children}
      <FieldNotes id={id} help={help} error={error} />
    </div>
  );
}

/** Error and help under an input, with the ids that `fieldAria` names. */
export function FieldNotes({ id, help, error }: { id: string; help?: string; error?: string | null }) {
  return (
    <>
      {error && (
        <p id={`${id}-error`} className="field-error">
          <Glyph name="outside" size={18} className="-mt-px flex-none" />
          {error}
        </p>
      )}
      {help && (
        <p id={`${id}-help`} className="field-help">
          {help}
        </p>
      )}
    </>
  );
}
