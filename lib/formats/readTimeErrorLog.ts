import type { TimeErrorSeries } from "@/lib/gnss/timing/timeError";
import { FormatError } from "./FormatError";

/** Readings, gaps included, that a log may hold: a day at ten a second. */
const MOST_READINGS = 864_000;
/** A reading may stand this share of an interval beside its place. */
const SLACK = 0.02;

export type TimeErrorLog = {
  series: TimeErrorSeries;
  /** Lines with a reading; fewer than places in the series where some are missing. */
  readings: number;
};

/**
 * A log of time errors: one reading a line, its time and the error in ns, with a space, tab, comma or semicolon between.
 * The time is in seconds from any beginning, or a time stamp as in ISO 8601 (2026-03-14T10:00:00.5Z). Empty lines, lines
 * that begin with # and a heading in the first line are passed over. Readings stand at even intervals; missing ones leave a gap.
 * @throws FormatError with the line, for what is not a reading, not later than the line before, or off the interval
 */
export function readTimeErrorLog(text: string): TimeErrorLog {
  const found = readLines(text);
  if (found.length < 3)
    throw new FormatError({ line: 1, column: 1 }, `A log has three readings at least, and here are ${found.length}.`);
  const intervalS = usualStep(found);
  const begun = found[0].timeS;
  const places = found.map(({ timeS, line }) => placeOf(timeS - begun, intervalS, line));
  const length = places[places.length - 1] + 1;
  if (length > MOST_READINGS)
    throw new FormatError(
      { line: found[found.length - 1].line, column: 1 },
      `With its gaps the log has ${length} places; ${MOST_READINGS} can be read.`,
    );
  const valuesNs = new Float64Array(length).fill(NaN);
  found.forEach(({ errorNs }, at) => (valuesNs[places[at]] = errorNs));
  return { series: { intervalS, valuesNs }, readings: found.length };
}

type Line = { line: number; timeS: number; errorNs: number };

function readLines(text: string): Line[] {
  const found: Line[] = [];
  let started = false;
  for (const [at, raw] of text.split(/\r\n|\r|\n/).entries()) {
    const written = raw.replace(/^\uFEFF/, "").trim();
    if (written === "" || written.startsWith("#")) continue;
    const reading = readLine(written);
    const line = at + 1;
    if (reading === null && !started && /^[^\d+\-.]/.test(written)) {
      started = true; // the heading
      continue;
    }
    started = true;
    if (reading === null)
      throw new FormatError({ line, column: 1 }, `“${written.slice(0, 60)}” is not a time and a time error in ns.`);
    const before = found[found.length - 1];
    if (before && !(reading.timeS > before.timeS))
      throw new FormatError({ line, column: 1 }, `This reading is not later than that of line ${before.line}.`);
    if (found.length >= MOST_READINGS)
      throw new FormatError({ line, column: 1 }, `More than ${MOST_READINGS} readings cannot be read.`);
    found.push({ line, ...reading });
  }
  return found;
}

const STAMP = /^(\d{4})-(\d\d)-(\d\d)[T ](\d\d):(\d\d):(\d\d(?:\.\d+)?)Z?$/;
const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i;

/** The error is the last figure of the line, the time all before it: a time stamp may hold a space. */
function readLine(written: string): { timeS: number; errorNs: number } | null {
  const parted = /^(.*?)(?:\s*[;,]\s*|\s+)([^\s;,]+)$/.exec(written.replace(/\u2212/g, "-"));
  if (!parted) return null;
  const timeS = readTime(parted[1].trim());
  if (timeS === null || !NUMBER.test(parted[2])) return null;
  return { timeS, errorNs: Number(parted[2]) };
}

function readTime(written: string): number | null {
  if (NUMBER.test(written)) return Number(written);
  const stamp = STAMP.exec(written);
  if (!stamp) return null;
  const [year, month, day, hour, minute] = stamp.slice(1, 6).map(Number);
  return Date.UTC(year, month - 1, day, hour, minute) / 1000 + Number(stamp[6]);
}

/** The usual distance of two readings: gaps and one wrong time leave the median where it is. */
function usualStep(found: readonly Line[]): number {
  const steps = found.slice(1).map(({ timeS }, at) => timeS - found[at].timeS);
  const step = steps.sort((a, b) => a - b)[Math.floor(steps.length / 2)];
  // Time stamps are rounded; the mean over the whole log is not, as long as no reading is missing.
  const span = found[found.length - 1].timeS - found[0].timeS;
  const count = Math.round(span / step);
  return Math.abs(span / count - step) <= SLACK * step ? span / count : step;
}

function placeOf(sinceS: number, intervalS: number, line: number): number {
  const place = Math.round(sinceS / intervalS);
  if (Math.abs(sinceS - place * intervalS) <= SLACK * intervalS) return place;
  throw new FormatError(
    { line, column: 1 },
    `The readings stand ${Number(intervalS.toPrecision(6))} s apart, and this one stands between two places.`,
  );
}
