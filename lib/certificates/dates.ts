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

/** "14 March 2026, 11:22:51": an instant as a clock of that zone shows it. */
export function instantInZone(instant: string, timeZone: string): string {
  const at = new Date(instant);
  const clock = new Intl.DateTimeFormat("en-GB", { timeZone, timeStyle: "medium", hourCycle: "h23" }).format(at);
  return `${dayInWords(dayIn(timeZone, at))}, ${clock}`;
}

/** "UTC+01:00": how far that zone's clock is ahead at an instant. */
export function offsetInZone(instant: string, timeZone: string): string {
  const format = new Intl.DateTimeFormat("en-GB", { timeZone, timeZoneName: "longOffset" });
  const name = format.formatToParts(new Date(instant)).find(({ type }) => type === "timeZoneName")!.value;
  return name.replace("GMT", "UTC");
}

function instantText(text: string): string | null {
  const date = new Date(text);
  return Number.isNaN(date.getTime()) ? null : date.toISOString();
}
