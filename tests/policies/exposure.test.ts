import { describe, expect, test } from "vitest";
import { exposedUntil, exposureReason, type OpenedCase } from "@/lib/policies/exposure";

// The limits and the twelve months are this product's own rule; days are counted by hand on the calendar.
const TODAY = "2026-12-01";
const READING = { id: "reading", kind: "correlator-reading", moduleId: "m1" };
const on = (...days: string[]): OpenedCase[] =>
  days.map((day) => ({ kind: "correlator-reading", checkId: "reading", moduleId: "m1", day }));

test.each<[string, string[], number | undefined, string | null]>([
  ["nothing yet", [], undefined, null],
  ["two, of the three that are usual", ["2026-11-01", "2026-11-20"], undefined, null],
  ["three: until the oldest is twelve months old", ["2026-11-20", "2026-03-05", "2026-11-01"], undefined, "2027-03-05"],
  ["three, the oldest twelve months old today", ["2025-12-01", "2026-11-01", "2026-11-20"], undefined, null],
  ["three, the oldest a day short of that", ["2025-12-02", "2026-11-01", "2026-11-20"], undefined, "2026-12-02"],
  [
    "five, by a sitting that was let pass: until the third oldest goes",
    ["2026-01-01", "2026-02-01", "2026-03-01", "2026-04-01", "2026-05-01"],
    undefined,
    "2027-03-01",
  ],
  ["one today, where one is allowed", ["2026-12-01"], 1, "2027-12-01"],
  ["three, where four are allowed", ["2026-10-01", "2026-11-01", "2026-11-20"], 4, null],
  ["one on a leap day", ["2024-02-29", "2026-02-28"], 1, "2027-02-28"],
])("%s", (_what, days, exposure, expected) => {
  expect(exposedUntil(READING, on(...days), { exposure }, TODAY)).toBe(expected);
});

test("a case of a leap day counts until the last day of February", () => {
  expect(exposedUntil(READING, on("2024-02-29"), { exposure: 1 }, "2025-02-27")).toBe("2025-02-28");
  expect(exposedUntil(READING, on("2024-02-29"), { exposure: 1 }, "2025-02-28")).toBe(null);
});

describe("what is one kind", () => {
  const days = ["2026-10-01", "2026-10-02", "2026-10-03"];
  const opened = (kind: string, checkId: string, moduleId: string) =>
    days.map((day) => ({ kind, checkId, moduleId, day }));

  test.each([
    ["the same kind in another check and module", "cn0", "other", "m2", "2027-10-01"],
    ["another kind", "chain", "it", "m1", null],
  ])("%s", (_what, kind, checkId, moduleId, expected) => {
    const check = { id: "it", kind: "cn0", moduleId: "m1" };
    expect(exposedUntil(check, opened(kind, checkId, moduleId), {}, TODAY)).toBe(expected);
  });

  test.each(["formula", "written"])("%s: the lead's own check of the one module", (kind) => {
    const check = { id: "delay", kind, moduleId: "m1" };
    expect(exposedUntil(check, opened(kind, "delay", "m1"), {}, TODAY)).toBe("2027-10-01");
    expect(exposedUntil(check, opened(kind, "loss", "m1"), {}, TODAY)).toBe(null);
    expect(exposedUntil(check, opened(kind, "delay", "m2"), {}, TODAY)).toBe(null);
  });
});

test("says the limit and the day", () => {
  expect(exposureReason({}, "2027-03-05")).toBe(
    "Within 12 months a person opens at most 3 cases of one kind. The next can be opened from 2027-03-05 on.",
  );
  expect(exposureReason({ exposure: 1 }, "2027-03-05")).toMatch(/at most 1 case of one kind/);
});
