import "server-only";

/** The fields of a form, or of a plain object that a client component sent. A name that occurs twice gives a list. */
export function formValues(input: FormData | Readonly<Record<string, unknown>>): Record<string, unknown> {
  if (!(input instanceof FormData)) return { ...input };
  // Next's own fields stand among a form's when it is sent without scripts.
  const names = [...new Set(input.keys())].filter((name) => !name.startsWith("$ACTION"));
  return Object.fromEntries(
    names.map((name) => {
      const values = input.getAll(name);
      return [name, values.length > 1 ? values : values[0]];
    }),
  );
}
