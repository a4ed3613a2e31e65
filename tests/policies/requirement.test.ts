import { expect, test } from "vitest";
import { requirementMet, type Requirement } from "@/lib/policies/requirement";

const ALL: Requirement = { all: ["a", "b"] };
const SOME: Requirement = { all: [], some: { of: ["a", "b", "c"], count: 2 } };
const BOTH: Requirement = { all: ["a"], some: { of: ["b", "c"], count: 1 } };

test.each<[string, Requirement, string[], boolean]>([
  ["all, all met", ALL, ["a", "b"], true],
  ["all, more met than asked", ALL, ["a", "b", "c"], true],
  ["all, one missing", ALL, ["a"], false],
  ["all, none", ALL, [], false],
  ["some, enough", SOME, ["c", "a"], true],
  ["some, one too few", SOME, ["a"], false],
  ["some, one of them and one that does not count", SOME, ["a", "x"], false],
  ["both, both", BOTH, ["a", "c"], true],
  ["both, only all", BOTH, ["a"], false],
  ["both, only some", BOTH, ["b", "c"], false],
  ["nothing of some asked", { all: ["a"], some: null }, ["a"], true],
])("%s", (_what, require, met, expected) => {
  expect(requirementMet(require, new Set(met))).toBe(expected);
});
