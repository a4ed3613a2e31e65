import { expect, test } from "vitest";
import {
  shownStanding,
  standingActs,
  type ShownStanding,
  type StandingAct,
  type StandingWord,
} from "@/lib/policies/standing";

const [FIRST, LAST] = ["2026-03-14", "2029-03-13"];

// Stored word, today, what is shown; first and last day belong to the certificate.
test.each<[StandingWord, string, ShownStanding]>([
  ["valid", "2026-03-13", "Not yet valid"],
  ["valid", "2026-03-14", "Valid"],
  ["valid", "2029-03-13", "Valid"],
  ["valid", "2029-03-14", "Expired"],
  ["suspended", "2027-01-01", "Suspended"],
  ["suspended", "2026-03-13", "Suspended"],
  ["suspended", "2029-03-14", "Expired"],
  ["withdrawn", "2026-03-13", "Withdrawn"],
  ["withdrawn", "2027-01-01", "Withdrawn"],
  ["withdrawn", "2029-03-14", "Withdrawn"],
  ["superseded", "2027-01-01", "Superseded"],
  ["superseded", "2029-03-14", "Superseded"],
])("%s on %s is shown as %s", (stored, today, shown) => {
  expect(shownStanding(stored, FIRST, LAST, today)).toBe(shown);
});

// Every act from every word: what it becomes, or nothing where the act is refused.
test.each<[StandingWord, StandingAct, StandingWord | null]>([
  ["valid", "suspend", "suspended"],
  ["valid", "reinstate", null],
  ["valid", "withdraw", "withdrawn"],
  ["suspended", "suspend", null],
  ["suspended", "reinstate", "valid"],
  ["suspended", "withdraw", "withdrawn"],
  ["withdrawn", "suspend", null],
  ["withdrawn", "reinstate", null],
  ["withdrawn", "withdraw", null],
  ["superseded", "suspend", null],
  ["superseded", "reinstate", null],
  ["superseded", "withdraw", null],
])("%s, %s: %s", (from, act, to) => {
  const rule = standingActs[act];
  expect(rule.from.includes(from) ? rule.to : null).toBe(to);
});
