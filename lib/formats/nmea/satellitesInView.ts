import { FormatError } from "../FormatError";
import type { Sentence } from "./readSentence";
import { writeSentence } from "./writeSentence";

/** C/N0 null: in view and not tracked. */
export type InView = { prn: number; elevationDeg: number; azimuthDeg: number; cn0DbHz: number | null };

const PER_SENTENCE = 4;
const MOST_SENTENCES = 9; // the count is one figure
const two = (value: number) => String(value).padStart(2, "0");
const three = (value: number) => String(value).padStart(3, "0");

/**
 * GSV sentences of one epoch, four satellites in each: number of sentences, number of this one, satellites in view, then
 * PRN, elevation, azimuth and C/N0 of each, all whole numbers. IEC 61162-1 (NMEA 0183), from memory, without a signal number.
 */
export function writeSatellitesInView(talker: string, satellites: readonly InView[]): string {
  const count = Math.max(1, Math.ceil(satellites.length / PER_SENTENCE));
  if (count > MOST_SENTENCES) throw new RangeError(`writeSatellitesInView: at most 36, got ${satellites.length}`);
  const sentence = (_: unknown, n: number) =>
    writeSentence(`${talker}GSV`, [
      String(count),
      String(n + 1),
      two(satellites.length),
      ...satellites.slice(n * PER_SENTENCE, (n + 1) * PER_SENTENCE).flatMap(fieldsOf),
    ]);
  return Array.from({ length: count }, sentence).join("");
}

const fieldsOf = ({ prn, elevationDeg, azimuthDeg, cn0DbHz }: InView) => [
  two(prn),
  two(elevationDeg),
  three(azimuthDeg),
  cn0DbHz === null ? "" : two(cn0DbHz),
];

export type InViewPart = { sentences: number; number: number; inView: number; satellites: InView[] };

/**
 * What one GSV sentence says. Satellites without a direction are left out; a signal number at the end is passed over.
 * @throws FormatError with its line, where a field is no whole number or out of its range
 */
export function readSatellitesInView({ line, fields }: Sentence): InViewPart {
  const whole = (at: number, name: string, from: number, to: number): number => {
    const text = fields[at] ?? "";
    const value = /^\d{1,3}$/.test(text) ? Number(text) : NaN;
    if (value >= from && value <= to) return value;
    throw new FormatError({ line, column: columnOf(fields, at) }, `${name} is from ${from} to ${to}, not “${text}”.`);
  };
  const groups = Math.floor((fields.length - 3) / 4);
  const satellites: InView[] = [];
  for (let group = 0; group < groups; group++) {
    const at = 3 + 4 * group;
    if (fields[at] === "" || fields[at + 1] === "" || fields[at + 2] === "") continue;
    satellites.push({
      prn: whole(at, "A satellite number", 1, 999),
      elevationDeg: whole(at + 1, "Elevation", 0, 90),
      azimuthDeg: whole(at + 2, "Azimuth", 0, 360) % 360,
      cn0DbHz: fields[at + 3] === "" ? null : whole(at + 3, "C/N0", 0, 99),
    });
  }
  const sentences = whole(0, "The number of sentences", 1, MOST_SENTENCES);
  return {
    sentences,
    number: whole(1, "The number of this sentence", 1, sentences),
    inView: whole(2, "The number of satellites in view", 0, 99),
    satellites,
  };
}

/** Of a field in its line: `$`, five letters and a comma stand before the first. */
const columnOf = (fields: readonly string[], at: number) =>
  fields.slice(0, at).reduce((column, field) => column + field.length + 1, 8);
