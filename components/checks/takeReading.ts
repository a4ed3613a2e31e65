import type { Reading } from "@/components/calculators/reading";
import type { FieldSpec, FormSection } from "@/lib/checks/kind";
import { fieldsOfRow, rowsShown } from "./formFields";

type Answers = Readonly<Record<string, string>>;
export type Taken = { id: string; label: string; value: string };

/** Which part of a reading belongs into a field of this name, written as a person would type it. */
const PARTS: Readonly<Record<string, (reading: Reading) => string | null>> = {
  prn: ({ prn }) => (prn === undefined ? null : String(prn)),
  codePhase: ({ codePhaseChips }) => text(codePhaseChips, 2),
  doppler: ({ dopplerHz }) => text(dopplerHz, 0),
  cn0: ({ cn0DbHz }) => text(cn0DbHz, 1),
  lag: ({ lagChips }) => text(lagChips, 3),
  centre: ({ centreKhz }) => text(centreKhz, 1),
  bandwidth: ({ widthKhz }) => text(widthKhz, 1),
  period: ({ periodUs }) => text(periodUs, 2),
  level: ({ levelDb }) => text(levelDb, 1),
  floor: ({ floorDb }) => text(floorDb, 1),
  east: ({ eastM }) => text(eastM, 0),
  north: ({ northM }) => text(northM, 0),
  major: ({ semiMajorM }) => text(semiMajorM, 0),
  minor: ({ semiMinorM }) => text(semiMinorM, 0),
  azimuth: ({ azimuthDeg }) => text(azimuthDeg, 0),
};
/** These are taken only while they are open: which satellite stands behind another, and which echo is which, is for the person to say. */
const WHEN_OPEN: typeof PARTS = {
  ownLine: ({ levelDb }) => text(levelDb, 1),
  ...PARTS,
  parent: PARTS.prn!,
  start: ({ utc }) => utc ?? null,
  stop: ({ utc }) => utc ?? null,
  azimuthFrom: ({ azimuthDeg }) => text(azimuthDeg, 0),
  azimuthTo: ({ azimuthDeg }) => text(azimuthDeg, 0),
  lead: ({ timeNs }) => text(timeNs, 1),
  end: ({ timeNs }) => text(timeNs, 1),
  time: ({ timeS }) => (timeS === undefined ? null : text(timeS / 60, 1)),
  maxTe: ({ levelNs }) => (levelNs === undefined ? null : text(Math.abs(levelNs), 1)),
};

/** The verdict that makes a satellite the one whose false lock is asked about. */
const CALLED_FALSE = "cross-correlation";

/**
 * What a reading fills in: the open field alone, where the reading has something for it. Else its satellite's row, the
 * first empty row, or the section that asks for it; of one satellite among many only when the person has named it.
 * @param open id of the answer field that was entered last, null when none was
 */
export function takeReading(
  sections: readonly FormSection[],
  answers: Answers,
  reading: Reading,
  open: string | null,
): Taken[] {
  const fields = sections.flatMap((section) =>
    Array.from({ length: rowsShown(section, answers) }, (_, index) => fieldsOfRow(section, index + 1)).flat(),
  );
  const opened = fields.find(({ id }) => id === open);
  const repeats = sections.some((section) => section.repeat && open?.startsWith(`${section.id}.`));
  const wanted = opened && !repeats ? taken(opened.id, opened.spec, reading, WHEN_OPEN) : null;
  if (wanted) return [wanted];
  return sections.flatMap((section) => [
    ...(isAbout(section, answers, reading)
      ? fieldsOfRow(section, rowFor(section, answers, reading)).flatMap(
          ({ id, spec }) => taken(id, spec, reading, PARTS) ?? [],
        )
      : []),
    ...binOf(section, answers, reading),
  ]);
}

/** Rows are found by their satellite. Fields that stand once are about the one satellite that the person called false. */
const isAbout = (section: FormSection, answers: Answers, { prn }: Reading): boolean =>
  Boolean(section.repeat) || prn === undefined || answers[`verdicts.prn${prn}`] === CALLED_FALSE;

function taken(id: string, spec: FieldSpec, reading: Reading, parts: typeof PARTS): Taken | null {
  const value = Object.hasOwn(parts, spec.id) ? parts[spec.id]!(reading) : null;
  return value === null ? null : { id, label: spec.label, value };
}

function binOf(section: FormSection, answers: Answers, { binHz }: Reading): Taken[] {
  const id = `${section.id}.bin`;
  const spec = section.fields.find((field) => field.id === "bin");
  if (!spec || binHz === undefined || (answers[id] ?? "").trim()) return [];
  return [{ id, label: spec.label, value: text(binHz, 0)! }];
}

function rowFor(section: FormSection, answers: Answers, { prn }: Reading): number {
  const rows = rowsShown(section, answers);
  for (let row = 1; row <= rows; row++) if (answers[`${section.id}.${row}.prn`]?.trim() === String(prn)) return row;
  return rows;
}

const text = (value: number | undefined, decimals: number): string | null =>
  value === undefined ? null : value.toFixed(decimals).replace("-", "\u2212");
