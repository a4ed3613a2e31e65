import { expect, test } from "vitest";
import { SignInAfreshError } from "@/lib/errors";
import { requireAfresh } from "@/lib/policies/requireAfresh";
import { NOW } from "../support/clock";

const FIVE_MINUTES_MS = 300_000;
const before = (ms: number) => new Date(NOW.getTime() - ms);

test.each([0, 1, FIVE_MINUTES_MS])("a password given %i ms ago is afresh", (ms) => {
  expect(requireAfresh({ passwordAt: before(ms) }, NOW)).toEqual(before(ms));
});

test.each([
  ["a millisecond more than five minutes ago", before(FIVE_MINUTES_MS + 1)],
  ["never, as after a mailed link", null],
  ["at no time", before(NaN)],
])("a password given %s is not", (_when, passwordAt) => {
  expect(() => requireAfresh({ passwordAt }, NOW)).toThrow(SignInAfreshError);
});
