import { expect, test } from "vitest";
import { addDays, addMonths, dayIn, daysBetween } from "@/lib/calendar";

// Offsets by the IANA time zone database: Kiritimati UTC+14, Honolulu UTC-10, London UTC and UTC+1 in summer.
test.each([
  ["UTC", "2026-12-01T00:00:00Z", "2026-12-01"],
  ["UTC", "2026-12-01T23:59:59.999Z", "2026-12-01"],
  ["Pacific/Kiritimati", "2026-12-01T09:59:59Z", "2026-12-01"],
  ["Pacific/Kiritimati", "2026-12-01T10:00:00Z", "2026-12-02"],
  ["Pacific/Honolulu", "2026-12-01T09:59:59Z", "2026-11-30"],
  ["Pacific/Honolulu", "2026-12-01T10:00:00Z", "2026-12-01"],
  ["Europe/London", "2026-07-01T22:59:59Z", "2026-07-01"],
  ["Europe/London", "2026-07-01T23:00:00Z", "2026-07-02"],
  ["Europe/London", "2026-12-31T23:59:59Z", "2026-12-31"],
])("in %s it is at %s the day %s", (timeZone, at, day) => {
  expect(dayIn(timeZone, new Date(at))).toBe(day);
});

test.each([
  ["2026-12-01", 0, "2026-12-01"],
  ["2026-12-01", 29, "2026-12-30"],
  ["2026-12-31", 1, "2027-01-01"],
  ["2028-02-28", 1, "2028-02-29"],
  ["2027-02-28", 1, "2027-03-01"],
  ["2026-03-01", -1, "2026-02-28"],
  // Clocks go forward in this night in Europe; a day is a day.
  ["2026-03-28", 1, "2026-03-29"],
])("%s and %i days is %s", (day, days, expected) => {
  expect(addDays(day, days)).toBe(expected);
});

test.each([
  ["2026-03-14", 36, "2029-03-14"],
  ["2026-01-31", 1, "2026-02-28"],
  ["2028-01-31", 1, "2028-02-29"],
  ["2026-12-15", 1, "2027-01-15"],
  ["2024-02-29", 24, "2026-02-28"],
  ["2026-05-31", 1, "2026-06-30"],
  ["2026-08-31", 6, "2027-02-28"],
  ["2026-12-01", 0, "2026-12-01"],
])("%s and %i months is %s", (day, months, expected) => {
  expect(addMonths(day, months)).toBe(expected);
});

test.each([
  ["2026-12-01", "2026-12-01", 0],
  ["2026-12-01", "2026-12-30", 29],
  ["2026-12-30", "2026-12-01", -29],
  ["2024-02-28", "2024-03-01", 2],
  ["2026-03-28", "2026-03-30", 2],
])("from %s to %s there are %i days", (from, to, days) => {
  expect(daysBetween(from, to)).toBe(days);
});
