const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** "2026-03-14" as 14 Mar 2026, the same on server and screen whatever their locale. */
export function formatDay(day: string): string {
  const [year, month, date] = day.slice(0, 10).split("-").map(Number) as [number, number, number];
  return `${date} ${MONTHS[month - 1]} ${year}`;
}

/** An instant as 14 Mar 2026, 15:02:44 UTC. Universal time is written out, since readers sit in different zones. */
export function formatInstant(instant: string, { seconds = false } = {}): string {
  const iso = new Date(instant).toISOString();
  return `${formatDay(iso)}, ${iso.slice(11, seconds ? 19 : 16)} UTC`;
}
