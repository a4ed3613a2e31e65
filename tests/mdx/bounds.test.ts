import { expect, test } from "vitest";
import { LIMITS } from "@/lib/mdx/limits";
import { parseInThread } from "@/lib/mdx/parseInThread";
import { precheck } from "@/lib/mdx/precheck";
import { readModule } from "@/lib/mdx/readModule";
import { FRONT_MATTER, moduleOf } from "./moduleText";

const list = (levels: number, step: number) =>
  Array.from({ length: levels }, (_, level) => `${" ".repeat(level * step)}- a`).join("\n");

// Each of these kept the bare parser busy for seconds to minutes, or ended it, when it was tried.
const BUSY: [what: string, source: string, rule: string][] = [
  ["crossed emphasis", "*a_ ".repeat(15_000), "marks"],
  ["crossed strikes", "~~a~ ".repeat(12_000), "marks"],
  ["lazy lines behind quotation marks", `${"> ".repeat(39)}a\n${"b\n".repeat(1900)}`, "nesting"],
  ["thousands of formulas", "$x$ ".repeat(5000), "marks"],
  ["formulas spread over blocks", `${"$x$ ".repeat(100)}\n\n`.repeat(30), "marks"],
  ["a list 400 deep", list(150, 2), "nesting"],
  ["markers that open each other on every line", "1. ".repeat(8).concat("a\n").repeat(1900), "nesting"],
  ["quotations in lists on every line", "> - ".repeat(4).concat("a\n").repeat(1900), "nesting"],
  ["open brackets", "[".repeat(15_000), "marks"],
  ["open links", `${"[a](".repeat(70)}\n\n`.repeat(200), "marks"],
  ["open braces", "{ ".repeat(15_000), "marks"],
  ["open tags", "<Check>\n".repeat(1400), "marks"],
  ["backticks of every length", Array.from({ length: 300 }, (_, n) => "`".repeat(n % 80)).join(" a "), "marks"],
  ["a table of 12,000 cells", `${"|a".repeat(700)}\n${"|-".repeat(700)}\n\n`.repeat(20), "marks"],
  ["entities", "&amp;".repeat(12_000), "marks"],
  ["escapes", "\\a".repeat(15_000), "marks"],
  ["a comment that never ends", `{${"/* * ".repeat(10_000)}`, "marks"],
];

test.each(BUSY)("%s: the linear check refuses it before the parser", async (_what, source, rule) => {
  expect(precheck(source).map((problem) => problem.rule)).toContain(rule);
  const { module, problems, tree } = await readModule(source);
  expect([module, tree]).toEqual([null, null]);
  expect(problems.every(({ line, column }) => line >= 1 && column >= 1)).toBe(true);
});

test("the linear check reports each rule once, at its first place", () => {
  const found = precheck(`a\u0000\u0000\n\n${"*".repeat(401)}\n${"*".repeat(401)}`);
  expect(found.map(({ line, column, rule }) => [line, column, rule])).toEqual([
    [1, 2, "character"],
    [3, 1, "marks"],
  ]);
});

test("64 kB and 2,000 lines are the most", () => {
  const kilobytes = "0123456789abcdef".repeat(64 * 64);
  expect(precheck(kilobytes)).toEqual([]);
  expect(precheck(`${kilobytes}x`)).toMatchObject([{ rule: "size" }]);
  expect(precheck("\n".repeat(1999))).toEqual([]);
  expect(precheck("\n".repeat(2000))).toMatchObject([{ line: 2001, column: 1, rule: "size" }]);
});

test("bytes count, not characters", () => {
  expect(precheck("µ".repeat(LIMITS.bytes / 2))).toEqual([]);
  expect(precheck("µ".repeat(LIMITS.bytes / 2 + 1))).toMatchObject([{ rule: "size" }]);
});

test("an ordinary text is far inside the bounds", () => {
  const table = `| part | ns |\n| --- | --- |\n${"| **cable** | `3.92` |\n".repeat(60)}\n`;
  expect(
    precheck(`${FRONT_MATTER}${"A *word* and $x_1$ in a [link](/bench). ".repeat(20)}\n\n${table}${list(8, 4)}`),
  ).toEqual([]);
});

test("nesting up to eight is read, nine is refused at its place", async () => {
  const eight = await readModule(moduleOf(list(8, 2)));
  expect(eight.problems).toEqual([]);
  const nine = await readModule(moduleOf(list(9, 2)));
  expect(nine.problems).toMatchObject([{ rule: "nesting", column: 17 }]);
});

test("a text that is still too slow is stopped, and the next one is read by a new thread", async () => {
  const slow = `${"*a_ ".repeat(190)}\n\n`.repeat(10);
  const [stopped, next] = await Promise.all([parseInThread(slow, 1), parseInThread("Text.")]);
  expect(stopped).toMatchObject({ tree: null, problems: [{ line: 1, column: 1, rule: "time" }] });
  expect(next.tree?.children).toMatchObject([{ tagName: "p" }]);
});

test("texts that arrive together are read one after the other, each for itself", async () => {
  const texts = Array.from({ length: 12 }, (_, n) => `Text ${n}.`);
  const read = await Promise.all(texts.map((text) => parseInThread(text)));
  expect(read.map(({ tree }) => JSON.stringify(tree?.children[0]))).toEqual(
    texts.map((value) =>
      JSON.stringify({ type: "element", tagName: "p", properties: {}, children: [{ type: "text", value }] }),
    ),
  );
});

test("more readings than can wait are refused with words", async () => {
  const all = await Promise.allSettled(
    Array.from({ length: LIMITS.waitingReadings + 1 }, () => parseInThread("Text.")),
  );
  expect(all.filter(({ status }) => status === "fulfilled")).toHaveLength(LIMITS.waitingReadings);
  expect(all.at(-1)).toMatchObject({
    status: "rejected",
    reason: { publicMessage: expect.stringMatching(/Try again/) },
  });
});

test("a hostile text does not become an endless list", async () => {
  const { problems } = await readModule(moduleOf(`<TwoCodes ${"x ".repeat(5000)}/>`));
  expect(problems).toHaveLength(200);
});

test("a few formulas that grow into millions of characters are refused", async () => {
  const matrix = `$$\\begin{matrix}${"a&".repeat(399)}\\end{matrix}$$\n\n`;
  const { problems, tree } = await readModule(moduleOf(matrix.repeat(8)));
  expect(tree).toBeNull();
  // On a slow machine the time is over first.
  expect(problems.map(({ rule }) => rule)).toEqual([expect.stringMatching(/^(size|time)$/)]);
});
