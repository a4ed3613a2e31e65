import type { FieldSpec, FormSection } from "@/lib/checks/kind";

export type FormField = { id: string; spec: FieldSpec };

/** How many rows of a repeating section stand on the screen: those with an answer, and one more. */
export function rowsShown(section: FormSection, answers: Readonly<Record<string, string>>): number {
  if (!section.repeat) return 1;
  const used = Object.entries(answers)
    .filter(([id, value]) => id.startsWith(`${section.id}.`) && value.trim() !== "")
    .map(([id]) => Number(id.split(".")[1]));
  return Math.min(section.repeat.max, Math.max(0, ...used) + 1);
}

export const fieldsOfRow = (section: FormSection, row: number): FormField[] =>
  section.fields.map((spec) => ({
    id: section.repeat ? `${section.id}.${row}.${spec.id}` : `${section.id}.${spec.id}`,
    spec,
  }));

/** Every field that is asked for: a row of a repeating section counts once something stands in it. */
export function askedFields(sections: readonly FormSection[], answers: Readonly<Record<string, string>>): FormField[] {
  return sections.flatMap((section) => {
    const rows = Array.from({ length: rowsShown(section, answers) }, (_, index) => fieldsOfRow(section, index + 1));
    return rows.filter((row) => !section.repeat || row.some(({ id }) => (answers[id] ?? "").trim() !== "")).flat();
  });
}

export const countGiven = (fields: readonly FormField[], answers: Readonly<Record<string, string>>): number =>
  fields.filter(({ id }) => (answers[id] ?? "").trim() !== "").length;
