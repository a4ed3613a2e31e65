import { FormatError } from "../FormatError";
import type { Sentence } from "./readSentence";
import { writeSentence } from "./writeSentence";

const two = (value: number) => String(value).padStart(2, "0");

/** ZDA sentence: UTC, day, month, year, no local zone. IEC 61162-1 (NMEA 0183), from memory. */
export function writeTimeAndDate(talker: string, unixMs: number): string {
  const [date, time] = new Date(unixMs).toISOString().split("T");
  const [year, month, day] = date.split("-");
  return writeSentence(`${talker}ZDA`, [`${time.slice(0, 8).replace(/:/g, "")}.00`, day, month, year, "00", "00"]);
}

/**
 * Time of a ZDA sentence in milliseconds since 1970.
 * @throws FormatError with its line for a time or a date that does not exist
 */
export function readTimeAndDate({ line, fields: [time = "", day = "", month = "", year = ""] }: Sentence): number {
  const clock = /^(\d\d)(\d\d)(\d\d)(\.\d+)?$/.exec(time);
  if (!clock) throw new FormatError({ line, column: 8 }, `“${time}” is not a time as hhmmss.`);
  const [hour, minute, second] = clock.slice(1, 4);
  const written = `${year}-${two(Number(month))}-${two(Number(day))}T${hour}:${minute}:${second}.000Z`;
  const unixMs = Date.parse(written);
  // A day that its month does not have is taken for one of the next month, which then reads differently.
  if (!Number.isFinite(unixMs) || new Date(unixMs).toISOString() !== written)
    throw new FormatError({ line, column: 8 }, `${day}.${month}.${year} ${time} is not a date and a time.`);
  return unixMs + Math.round(Number(clock[4] ?? 0) * 1000);
}
