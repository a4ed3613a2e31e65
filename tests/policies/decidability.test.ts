import { expect, test } from "vitest";
import { decidability, type DecidableCase } from "@/lib/policies/decidability";

const CHECKS = [{ id: "a" }, { id: "b" }];
const REQUIRE = { all: ["a", "b"] };
const marked = (checkId: string, met: boolean): DecidableCase => ({ checkId, state: "marked", met });
const unmarked = (checkId: string, state: "building" | "open" | "handed in"): DecidableCase => ({
  ...{ checkId, state, met: null },
});
const OPEN = "A case of this sitting is still open or being marked.";
const MISSING = "Not every check of this sitting has its marking record.";

test.each<[string, DecidableCase[], boolean, boolean | string]>([
  ["every check met", [marked("a", true), marked("b", true)], false, true],
  ["one not met", [marked("a", true), marked("b", false)], false, false],
  ["met in a fresh case", [marked("a", true), marked("b", false), marked("b", true)], false, true],
  ["met, then a fresh case not met", [marked("a", true), marked("b", true), marked("b", false)], false, true],
  ["one check without a case", [marked("a", true)], false, MISSING],
  ["no case at all", [], false, MISSING],
  ["one check without a case, the last day past", [marked("a", true)], true, false],
  ["no case at all, the last day past", [], true, false],
  ["one being built", [marked("a", true), unmarked("b", "building")], false, OPEN],
  ["one open", [marked("a", true), marked("b", false), unmarked("b", "open")], false, OPEN],
  ["one being marked, the last day past", [marked("a", true), unmarked("b", "handed in")], true, OPEN],
])("%s", (_what, cases, lastDayPassed, expected) => {
  const told = decidability(CHECKS, REQUIRE, cases, lastDayPassed);
  if (typeof expected === "string") expect(told).toEqual({ decidable: false, reason: expected });
  else expect(told).toEqual({ decidable: true, requirementMet: expected });
});
