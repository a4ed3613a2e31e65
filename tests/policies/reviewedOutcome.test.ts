import { expect, test } from "vitest";
import { reviewedOutcome, type ReviewedCase } from "@/lib/policies/reviewedOutcome";

// The release's own rule: all of these, and so many of those; a check is met when one of its cases is.
const one = (checkId: string, metBefore: boolean, met: boolean): ReviewedCase => ({ checkId, metBefore, met });
const REQUIRE = { all: ["a"], some: { of: ["b", "c"], count: 1 } };

test.each<[string, ReviewedCase[], { before: boolean; now: boolean }]>([
  ["no case", [], { before: false, now: false }],
  ["nothing changes", [one("a", true, true), one("b", true, true)], { before: true, now: true }],
  ["a required check falls", [one("a", true, false), one("b", true, true)], { before: true, now: false }],
  ["a required check is met now", [one("a", false, true), one("b", true, true)], { before: false, now: true }],
  [
    "one of several falls and another stands",
    [one("a", true, true), one("b", true, false), one("c", true, true)],
    { before: true, now: true },
  ],
  [
    "one case of a check falls, its fresh case stands",
    [one("a", true, false), one("a", false, true), one("b", true, true)],
    { before: true, now: true },
  ],
])("%s", (_what, cases, expected) => expect(reviewedOutcome(REQUIRE, cases)).toEqual(expected));
