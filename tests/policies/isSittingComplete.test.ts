import { expect, test } from "vitest";
import { isSittingComplete } from "@/lib/policies/isSittingComplete";

type Cases = Parameters<typeof isSittingComplete>[2];
const one = (checkId: string, number: number, met: boolean | null): Cases[number] => ({
  ...{ checkId, number, met, state: met === null ? "handed in" : "marked" },
});
const CHECKS = [{ id: "reading" }, { id: "delay" }];

test.each<[string, number, Cases, boolean]>([
  ["no case yet", 1, [], false],
  ["one check without a case", 1, [one("reading", 1, true)], false],
  ["every check met", 1, [one("reading", 1, true), one("delay", 1, true)], true],
  ["one still being marked", 1, [one("reading", 1, true), one("delay", 1, null)], false],
  ["one not met, a fresh case left", 1, [one("reading", 1, true), one("delay", 1, false)], false],
  ["one not met, none left", 0, [one("reading", 1, true), one("delay", 1, false)], true],
  ["the fresh case being marked", 1, [one("reading", 1, true), one("delay", 1, false), one("delay", 2, null)], false],
  ["the fresh case not met", 1, [one("reading", 1, true), one("delay", 1, false), one("delay", 2, false)], true],
  ["the fresh case met", 2, [one("delay", 2, true), one("delay", 1, false), one("reading", 1, true)], true],
])("%s, %i fresh cases allowed", (_what, freshCases, cases, expected) => {
  expect(isSittingComplete(CHECKS, { freshCases }, cases)).toBe(expected);
});
