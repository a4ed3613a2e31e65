import { dayIn } from "@/lib/calendar";

/** "2026-03-14", a day of the calendar. */
export const isDay = (text: string): boolean =>
  /^\d{4}-\d{2}-\d{2}$/.test(text) && instantText(`${text}T00:00:00.000Z`)?.slice(0, 10) === text;

/** "2026-03-14T10:22:51.000Z": UTC with milliseconds, as Date writes it, so that two of them compare as text. */
export const isInstant = (text: string): boolean => instantText(text) === text;

export function isTimeZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat("en", { timeZone: name }).resolvedOptions().timeZone.length > 0;
  } catch {
    return false;
  }
}

const MONTHS = "January February March April May June July August September October November December".split(" ");

/** "14 March 2026" */
export function dayInWords(day: string): string {
  const [year, month, date] = day.split("-");
  return `${Number(date)} ${MONTHS[Number(month) - 1]} ${year}`;
}

/** "14 March 2026, 10:22:51 UTC" */
export const instantInWords = (instant: string): string =>
  `${dayInWords(instant.slice(0, 10))}, ${instant.slice(11, 19)} UTC`;

/** "14 March 2026, 11:22:51 UTC+01:00": the same instant on a clock of that zone. */
export function instantInZone(instant: string, timeZone: string): string {
  const at = new Date(instant);
  const clock = new Intl.DateTimeFormat("en-GB", { timeZone, timeStyle: "medium", hourCycle: "h23" }).format(at);
  const parts = new Intl.DateTimeFormat("en-GB", { timeZone, timeZoneName: "longOffset" }).formatToParts(at);
  const offset = parts.find(({ type }) => type === "timeZoneName")?.value.replace("GMT", "UTC");
  return `${dayInWords(dayIn(timeZone, at))}, ${clock} ${offset}`;
}

function instantText(text: string): string | null {
  const date = new Date(text);
  return Number.isNaN(date.getTime()) ? null : date.toISOString();
}
