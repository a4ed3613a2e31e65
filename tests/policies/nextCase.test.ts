import { expect, test } from "vitest";
import { nextCaseOf, type EarlierCase } from "@/lib/policies/nextCase";
import { NOW } from "../support/clock";

const RULE = { freshCases: 1, waitHours: 24 };
const HOUR_MS = 3_600_000;
const hoursBefore = (hours: number, more = 0) => new Date(NOW.getTime() - hours * HOUR_MS + more);
const one = (state: EarlierCase["state"], over: Partial<EarlierCase> = {}): EarlierCase => ({
  ...{ id: "case", number: 1, state, met: null, handedInAt: null },
  ...over,
});
const notMet = (handedInAt: Date, number = 1) => one("marked", { met: false, handedInAt, number });

test.each<[string, EarlierCase[], object]>([
  ["none yet", [], { state: "available", number: 1 }],
  ["one being built", [one("building")], { state: "open", caseId: "case" }],
  ["one open", [one("open")], { state: "open", caseId: "case" }],
  ["one handed in", [one("handed in")], { state: "closed", reason: "The case you handed in is being marked." }],
  ["one met", [one("marked", { met: true })], { state: "closed", reason: "This check is met." }],
  ["one not met, the wait just over", [notMet(hoursBefore(24))], { state: "available", number: 2 }],
  [
    "one not met, a millisecond of the wait left",
    [notMet(hoursBefore(24, 1))],
    {
      ...{ state: "closed", reason: "A fresh case opens after the wait that the release asks for." },
      opensAt: "2026-12-01T10:00:00.001Z",
    },
  ],
  [
    "the last one that is allowed not met",
    [notMet(hoursBefore(99)), notMet(hoursBefore(48), 2)],
    { state: "closed", reason: "The release allows no further case of this check." },
  ],
  ["the fresh one open", [notMet(hoursBefore(99)), one("open", { number: 2 })], { state: "open", caseId: "case" }],
])("%s", (_what, earlier, expected) => {
  expect(nextCaseOf(earlier, RULE, NOW, null)).toEqual(expected);
});

test("a release that allows no fresh case closes after the first, and one without a wait opens at once", () => {
  const earlier = [notMet(NOW)];
  expect(nextCaseOf(earlier, { freshCases: 0, waitHours: 0 }, NOW, null)).toMatchObject({ state: "closed" });
  expect(nextCaseOf(earlier, { freshCases: 1, waitHours: 0 }, NOW, null)).toEqual({ state: "available", number: 2 });
});

test("after too many of the kind no fresh case opens, and the first one does", () => {
  expect(nextCaseOf([notMet(hoursBefore(24))], RULE, NOW, "Too many.")).toEqual({
    state: "closed",
    reason: "Too many.",
  });
  expect(nextCaseOf([], RULE, NOW, "Too many.")).toEqual({ state: "available", number: 1 });
  expect(nextCaseOf([one("open")], RULE, NOW, "Too many.")).toEqual({ state: "open", caseId: "case" });
});
