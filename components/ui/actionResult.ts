/** What a form's action answers: done, or a sentence, or a sentence for each field. */
export type ActionResult<R = unknown> =
  { ok: true; value: R } | { ok: false; message?: string; fields?: Partial<Record<string, string[]>> };

export type FormAction<R = unknown> = (previous: ActionResult<R> | null, form: FormData) => Promise<ActionResult<R>>;

export const messageOf = (result: ActionResult | null): string | null =>
  result && !result.ok ? (result.message ?? null) : null;

export const fieldError = (result: ActionResult | null, field: string): string | null =>
  result && !result.ok ? (result.fields?.[field]?.[0] ?? null) : null;
