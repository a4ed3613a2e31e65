/** Calendar days as "YYYY-MM-DD". A day belongs to a place: an issuer's days are those of its own time zone. */

/** The day it is at an instant in a time zone (IANA name). */
export const dayIn = (timeZone: string, at: Date): string =>
  new Intl.DateTimeFormat("en-CA", { timeZone, year: "numeric", month: "2-digit", day: "2-digit" }).format(at);

export function addDays(day: string, days: number): string {
  const at = new Date(`${day}T00:00:00Z`);
  at.setUTCDate(at.getUTCDate() + days);
  return at.toISOString().slice(0, 10);
}

/** The same day of a later month; the last of that month where it is shorter (31 January + 1 month = 28 February). */
export function addMonths(day: string, months: number): string {
  const [year, month, date] = day.split("-").map(Number) as [number, number, number];
  const lastOfMonth = new Date(Date.UTC(year, month - 1 + months + 1, 0));
  lastOfMonth.setUTCDate(Math.min(date, lastOfMonth.getUTCDate()));
  return lastOfMonth.toISOString().slice(0, 10);
}

/** Whole days from one day to another; negative when the second is earlier. */
export const daysBetween = (from: string, to: string): number =>
  Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);
