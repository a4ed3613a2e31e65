import { isBlank } from "./answerOf";

export type TimeReading = { secondsOfDay: number } | { none: true } | { problem: string };

const NONE = /^(none|no|never|nil|n\/a|[-\u2010-\u2015\u2212])$/i;
const CLOCK =
  /^(?:\d{4}-\d\d-\d\d[ t])?(\d{1,2}) ?[:.h] ?(\d{2})(?: ?[:.m] ?(\d{2})(?:[.,]\d+)?)? ?s?(?: ?(?:utc|z))?$/i;
const FIGURES = /^(\d{2})(\d{2})(\d{2})?(?:\.\d+)? ?(?:utc|z)?$/i;

/** "14:03:30", "14.03", "14:03:30 UTC", "140330", or "none" where there is nothing to time. */
export function parseTimeOfDay(text: string): TimeReading {
  if (isBlank(text)) return { problem: "Nothing was handed in." };
  const plain = text.replace(/[\s\u00a0\u2007\u2009\u202f]+/g, " ").trim();
  const shown = plain.length > 40 ? `${plain.slice(0, 40)}…` : plain;
  if (NONE.test(plain)) return { none: true };
  const parts = plain.length > 40 ? null : (CLOCK.exec(plain) ?? FIGURES.exec(plain));
  if (!parts) return { problem: `“${shown}” is not a time. Write hours, minutes and seconds: 14:03:30.` };
  const [hours, minutes, seconds] = [parts[1], parts[2], parts[3] ?? "0"].map(Number);
  if (hours > 23 || minutes > 59 || seconds > 59) return { problem: `A day has no ${shown}.` };
  return { secondsOfDay: hours * 3600 + minutes * 60 + seconds };
}

/** 14:03:30 of a time of day. */
export const clockText = (secondsOfDay: number): string =>
  [secondsOfDay / 3600, (secondsOfDay / 60) % 60, secondsOfDay % 60]
    .map((part) => String(Math.floor(part)).padStart(2, "0"))
    .join(":");
