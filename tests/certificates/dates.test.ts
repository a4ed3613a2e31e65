import { expect, test } from "vitest";
import { dayInWords, instantInWords, isDay, isInstant, isTimeZone } from "@/lib/certificates/dates";

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
