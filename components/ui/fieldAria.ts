export type FieldWords = { label: string; unit?: string; note?: string; help?: string; error?: string | null };

/** What ties an input to its label, help and error; the unit is part of the accessible name. */
export function fieldAria(id: string, { unit, help, error }: FieldWords) {
  const described = [error && `${id}-error`, help && `${id}-help`].filter(Boolean).join(" ");
  return {
    id,
    "aria-labelledby": unit ? `${id}-label ${id}-unit` : undefined,
    "aria-describedby": described || undefined,
    "aria-invalid": error ? (true as const) : undefined,
  };
}
