import { expect, test } from "vitest";
import {
  dayInWords,
  instantInWords,
  instantInZone,
  isDay,
  isInstant,
  isTimeZone,
  offsetInZone,
} from "@/lib/certificates/dates";

test.each(["2026-03-14", "2028-02-29"])("%s is a day", (text) => expect(isDay(text)).toBe(true));
test.each(["2026-02-29", "2026-13-01", "2026-3-14", "14 March 2026", "2026-03-14T00:00:00Z", ""])(
  "%j is no day",
  (text) => expect(isDay(text)).toBe(false),
);

test("an instant is UTC with milliseconds", () => {
  expect(isInstant("2026-03-14T10:22:51.000Z")).toBe(true);
  for (const text of [
    "2026-03-14T10:22:51Z",
    "2026-03-14T10:22:51.000+01:00",
    "2026-03-14",
    "soon",
    "2026-02-30T00:00:00.000Z",
  ]) {
    expect(isInstant(text), text).toBe(false);
  }
});

test("knows time zones by name", () => {
  expect(["Europe/London", "UTC", "Saltmarsh/Quay", ""].map(isTimeZone)).toEqual([true, true, false, false]);
});

test("writes days and instants in words", () => {
  expect(dayInWords("2029-12-01")).toBe("1 December 2029");
  expect(instantInWords("2026-03-14T10:22:51.000Z")).toBe("14 March 2026, 10:22:51 UTC");
});

// Time zone database: London +0 in winter and +1 in summer, Auckland +13 in southern summer, Kathmandu +5:45.
test.each([
  ["Europe/London", "2026-12-01T16:09:15.000Z", "1 December 2026, 16:09:15", "UTC+00:00"],
  ["Europe/London", "2026-07-01T23:30:05.000Z", "2 July 2026, 00:30:05", "UTC+01:00"],
  ["Pacific/Auckland", "2026-12-31T12:00:00.000Z", "1 January 2027, 01:00:00", "UTC+13:00"],
  ["Asia/Kathmandu", "2026-03-14T18:15:00.000Z", "15 March 2026, 00:00:00", "UTC+05:45"],
])("in %s the instant %s is %s", (timeZone, instant, clock, offset) => {
  expect(instantInZone(instant, timeZone)).toBe(clock);
  // Whether a zone at universal time is said with its zeros is the platform's choice.
  expect([offset, offset.replace("+00:00", "")]).toContain(offsetInZone(instant, timeZone));
});
