import type { Reading } from "@/components/calculators/reading";
import type { FormSection } from "@/lib/checks/kind";
import { fieldsOfRow, rowsShown } from "./formFields";

/** Which part of a reading belongs into a field of this name, written as a person would type it. */
const PARTS: Readonly<Record<string, (reading: Reading) => string | null>> = {
  prn: ({ prn }) => (prn === undefined ? null : String(prn)),
  codePhase: ({ codePhaseChips }) => text(codePhaseChips, 2),
  doppler: ({ dopplerHz }) => text(dopplerHz, 0),
  falseDoppler: ({ dopplerHz }) => text(dopplerHz, 0),
  cn0: ({ cn0DbHz }) => text(cn0DbHz, 1),
  falseCn0: ({ cn0DbHz }) => text(cn0DbHz, 1),
  lag: ({ lagChips }) => text(lagChips, 3),
};

/** The answers a reading fills in: into its satellite's row, the first empty row, or the section that asks for it. */
export function takeReading(
  sections: readonly FormSection[],
  answers: Readonly<Record<string, string>>,
  reading: Reading,
): Readonly<Record<string, string>> {
  const taken: Record<string, string> = {};
  for (const section of sections) {
    for (const { id, spec } of fieldsOfRow(section, rowFor(section, answers, reading))) {
      const value = PARTS[spec.id]?.(reading) ?? null;
      if (value !== null) taken[id] = value;
    }
    if (section.fields.some(({ id }) => id === "bin") && reading.binHz !== undefined) {
      const id = `${section.id}.bin`;
      if (!(answers[id] ?? "").trim()) taken[id] = text(reading.binHz, 0)!;
    }
  }
  return taken;
}

function rowFor(section: FormSection, answers: Readonly<Record<string, string>>, { prn }: Reading): number {
  const rows = rowsShown(section, answers);
  for (let row = 1; row <= rows; row++) if (answers[`${section.id}.${row}.prn`]?.trim() === String(prn)) return row;
  return rows;
}

const text = (value: number | undefined, decimals: number): string | null =>
  value === undefined ? null : value.toFixed(decimals).replace("-", "\u2212");
