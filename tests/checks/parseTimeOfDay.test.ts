import { describe, expect, test } from "vitest";
import { clockText, parseTimeOfDay } from "@/lib/checks/parseTimeOfDay";

test.each([
  ["14:03:30", 50610],
  [" 14:03:30 UTC ", 50610],
  ["14:03:30Z", 50610],
  ["14:03:30.00", 50610],
  ["2026-03-14T14:03:30Z", 50610],
  ["2026-03-14 14:03:30", 50610],
  ["14.03.30", 50610],
  ["14h03m30s", 50610],
  ["140330", 50610],
  ["140330.00", 50610],
  ["14:03", 50580],
  ["1403", 50580],
  ["9:05:00", 32700],
  ["00:00:00", 0],
  ["23:59:59", 86399],
])("%s", (text, secondsOfDay) => expect(parseTimeOfDay(text)).toEqual({ secondsOfDay }));

test.each(["none", "None", "-", "–", "\u2212", "n/a", " no "])("%s is no time", (text) =>
  expect(parseTimeOfDay(text)).toEqual({ none: true }),
);

describe("what cannot be read is said", () => {
  test.each([
    ["", "Nothing was handed in."],
    [" ", "Nothing was handed in."],
    ["24:00:00", "A day has no 24:00:00."],
    ["12:60", "A day has no 12:60."],
    ["noon", "“noon” is not a time. Write hours, minutes and seconds: 14:03:30."],
    ["14", "“14” is not a time. Write hours, minutes and seconds: 14:03:30."],
    ["1e400", "“1e400” is not a time. Write hours, minutes and seconds: 14:03:30."],
    ["\u221214:03:30", "“\u221214:03:30” is not a time. Write hours, minutes and seconds: 14:03:30."],
  ])("%j", (text, problem) => expect(parseTimeOfDay(text)).toEqual({ problem }));

  test("a long text is shown short", () =>
    expect(parseTimeOfDay("1:".repeat(5000))).toEqual({ problem: expect.stringMatching(/^.{1,120}$/) }));
});

test("printed as it is typed", () =>
  expect([0, 50610, 86399].map(clockText)).toEqual(["00:00:00", "14:03:30", "23:59:59"]));
