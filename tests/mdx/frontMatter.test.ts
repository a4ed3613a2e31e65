import { expect, test } from "vitest";
import { parseModule } from "@/lib/mdx/parseModule";
import { FRONT_MATTER } from "./moduleText";

const LINES = FRONT_MATTER.split("\n").slice(0, 12);

/** The example with its line of this number written otherwise; null leaves it out. */
function withLine(number: number, text: string | null) {
  const lines = LINES.flatMap((line, at) => (at + 1 === number ? (text === null ? [] : [text]) : [line]));
  return parseModule(lines.join("\n"));
}

test("a whole front matter is read into plain values", () => {
  expect(parseModule(LINES.join("\n"))).toMatchObject({
    problems: [],
    frontMatter: {
      code: "SBW-X1",
      title: "Try a module",
      valid: { months: 36, reason: "receiver families change slowly" },
      supervision: "open",
      aids: ["bench"],
      sitting: { days: 30, freshCases: 1, waitHours: 24 },
      require: { all: ["reading"], some: null },
    },
    required: [{ id: "reading", place: { line: 11, column: 18 } }],
  });
});

test("says how many cases of one kind a person may open in twelve months, or leaves it to the usual", () => {
  const { frontMatter } = withLine(10, "sitting: { days: 30, freshCases: 1, waitHours: 24, exposure: 12 }");
  expect(frontMatter?.sitting.exposure).toBe(12);
  expect(parseModule(LINES.join("\n")).frontMatter?.sitting.exposure).toBeUndefined();
});

test("require may stand over several lines and ask for some of several", () => {
  const { frontMatter, required } = withLine(11, "require:\n  all: [a]\n  some:\n    of: [b, c]\n    count: 1");
  expect(frontMatter?.require).toEqual({ all: ["a"], some: { of: ["b", "c"], count: 1 } });
  expect(required.map(({ id, place }) => [id, place.line, place.column])).toEqual([
    ["a", 12, 9],
    ["b", 14, 10],
    ["c", 14, 13],
  ]);
});

type Fault = [what: string, line: number, written: string | null, at: [line: number, column: number], says: RegExp];

test.each<Fault>([
  ["a missing line", 3, null, [2, 1], /"title" is missing.*title: Prove/],
  ["an empty line", 3, "title:", [3, 7], /"title" must be one line of 3 to 120 characters/],
  ["a code in small letters", 2, "code: sbw-x1", [2, 7], /"code" must be 2 to 24 capital letters/],
  ["a number where text belongs", 3, "title: 2026", [3, 8], /"title" must be one line/],
  ["a title of two lines", 3, 'title: "a\\nbcd"', [3, 8], /"title" must be one line/],
  ["a title too long", 3, `title: ${"x".repeat(121)}`, [3, 8], /3 to 120/],
  [
    "months by words",
    7,
    "valid: { months: three, reason: because }",
    [7, 18],
    /"valid.months" must be a whole number from 1/,
  ],
  ["no reason for the interval", 7, "valid: { months: 36 }", [7, 1], /"valid.reason" is missing/],
  ["half a month", 7, "valid: { months: 1.5, reason: because }", [7, 18], /whole number/],
  ["an unknown supervision", 8, "supervision: none", [8, 14], /open, remote or on-site/],
  ["aids that are no list", 9, "aids: bench", [9, 7], /list of at most 10 aids/],
  ["an aid that is no text", 9, "aids: [bench, [x]]", [9, 15], /2 to 80 characters/],
  ["days beyond a year", 10, "sitting: { days: 400, freshCases: 1, waitHours: 24 }", [10, 18], /from 1 to 365/],
  ["an unknown line", 9, "aids: [bench]\ncolour: blue", [10, 1], /"colour" is not read here\. Known are code, title/],
  [
    "an unknown entry",
    10,
    "sitting: { days: 3, freshCases: 1, waitHours: 2, tries: 3 }",
    [10, 50],
    /Known are days, freshCases, waitHours, exposure/,
  ],
  [
    "no case of a kind at all",
    10,
    "sitting: { days: 3, freshCases: 1, waitHours: 2, exposure: 0 }",
    [10, 60],
    /"sitting.exposure" must be a whole number from 1 to 12.*exposure: 3/,
  ],
  ["a line written twice", 4, "title: Again\nscope: Again", [4, 1], /unique/],
  ["nothing required", 11, "require: { all: [] }", [11, 1], /No check is required/],
  ["a check required twice", 11, "require: { all: [a, a] }", [11, 21], /"a" is required twice/],
  ["more required than named", 11, "require: { some: { of: [a], count: 2 } }", [11, 36], /2 of 1 checks cannot be met/],
  ["a bracket that is not closed", 9, "aids: [bench", [10, 1], /cannot be read/],
  ["an alias", 9, "aids: &a [bench]", [9, 10], /Anchors/],
  ["a type", 3, "title: !!js/function x", [3, 22], /Types|cannot be read/],
  ["the prototype", 9, "aids: []\n__proto__: { x: 1 }", [10, 1], /"__proto__" is not read here/],
])("%s is reported at its place", (_what, line, written, [atLine, column], says) => {
  const { problems, frontMatter } = withLine(line, written);
  expect(problems[0]).toMatchObject({ line: atLine, column, severity: "error" });
  expect(problems[0]?.message).toMatch(says);
  if (problems[0]?.rule === "front-matter") expect(frontMatter).toBeNull();
});

test("several faults are reported together", () => {
  const { problems } = parseModule("---\ncode: x\ntitle: ab\nvalid: 3\n---\n");
  expect(problems.map(({ line }) => line)).toEqual([2, 2, 2, 2, 2, 2, 2, 2, 3, 4]);
});

test("an alias that would unfold a thousandfold is not unfolded", () => {
  const bomb = "a: &a [x, x]\nb: &b [*a, *a]\nc: &c [*b, *b]\nd: [*c, *c]";
  expect(withLine(9, bomb).problems[0]?.message).toMatch(/are not read here/);
});

test("a module without front matter is offered one, and the offer can be read", () => {
  const { problems } = parseModule("# Text");
  expect(problems).toMatchObject([{ line: 1, column: 1, rule: "front-matter" }]);
  const repaired = parseModule(`${problems[0]?.repair?.text}# Text`);
  expect(repaired.problems.map(({ rule }) => rule)).toEqual(["require"]);
});
