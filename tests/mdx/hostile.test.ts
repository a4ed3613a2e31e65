import { describe, expect, test } from "vitest";
import { readModule } from "@/lib/mdx/readModule";
import { FIRST_LINE, moduleOf } from "./moduleText";

type Hostile = [what: string, source: string, line: number, column: number, rule: string];

const PROGRAM: Hostile[] = [
  ["an import", "import fs from 'fs'", 1, 1, "import-export"],
  ["an import that is not one", "import { from", 1, 1, "import-export"],
  ["an export", "Text.\n\nexport const a = fetch('/')", 3, 1, "import-export"],
  ["a default export", "export default () => null", 1, 1, "import-export"],
  ["an expression in a sentence", "The key is {process.env.SEED_KEY}.", 1, 12, "expression"],
  ["an expression on its own", "{globalThis.process.exit()}", 1, 1, "expression"],
  ["a called function", "{(() => { while (true); })()}", 1, 1, "expression"],
  ["a template", "{`${1}`}", 1, 1, "expression"],
  ["an expression behind a comment", "{/* harmless */ globalThis}", 1, 1, "expression"],
  ["an expression after many comments", `{${"/**/".repeat(90)}x}`, 1, 1, "expression"],
  ["a line comment, which could hide the brace", "{ // x\n}", 1, 1, "expression"],
  ["empty braces", "{}", 1, 1, "expression"],
  ["JSX in braces", "{<b>x</b>}", 1, 1, "expression"],
  ["what does not even parse", "a {if (} b", 1, 3, "expression"],
  ["an expression in a heading", "# {1 + 1}", 1, 3, "expression"],
  ["an expression in a table", "| a |\n| - |\n| {x} |", 3, 3, "expression"],
];

const ATTRIBUTES: Hostile[] = [
  ["a spread", "<TwoCodes {...globalThis} />", 1, 11, "spread"],
  ["a name", "<TwoCodes a={secret} />", 1, 14, "attribute-value"],
  ["a sum", "<TwoCodes a={1 + 1} />", 1, 14, "attribute-value"],
  ["a call", "<TwoCodes a={alert(1)} />", 1, 14, "attribute-value"],
  ["a member", "<TwoCodes a={process.env.X} />", 1, 14, "attribute-value"],
  ["a template without holes", "<TwoCodes a={`5`} />", 1, 14, "attribute-value"],
  ["a function", "<TwoCodes a={() => 5} />", 1, 14, "attribute-value"],
  ["a class", "<TwoCodes a={class {}} />", 1, 14, "attribute-value"],
  ["a new object", "<TwoCodes a={new Date()} />", 1, 14, "attribute-value"],
  ["a pattern", "<TwoCodes a={/x/g} />", 1, 14, "attribute-value"],
  ["a big integer", "<TwoCodes a={5n} />", 1, 14, "attribute-value"],
  ["a hexadecimal number", "<TwoCodes a={0x10} />", 1, 14, "attribute-value"],
  ["a number beyond all bounds", "<TwoCodes a={1e999} />", 1, 14, "attribute-value"],
  ["not a number", "<TwoCodes a={NaN} />", 1, 14, "attribute-value"],
  ["a minus name", "<TwoCodes a={-x} />", 1, 14, "attribute-value"],
  ["a plus number", "<TwoCodes a={+5} />", 1, 14, "attribute-value"],
  ["two values", "<TwoCodes a={5, 6} />", 1, 14, "attribute-value"],
  ["JSX as a value", "<TwoCodes a={<b />} />", 1, 14, "attribute-value"],
  ["a list with a hole", "<TwoCodes a={[, 1]} />", 1, 14, "attribute-value"],
  ["a spread in a list", "<TwoCodes a={[...x]} />", 1, 15, "attribute-value"],
  ["a spread in a record", "<TwoCodes a={{ ...x }} />", 1, 16, "attribute-value"],
  ["a computed key", "<TwoCodes a={{ [x]: 1 }} />", 1, 16, "attribute-value"],
  ["a shorthand key", "<TwoCodes a={{ x }} />", 1, 16, "attribute-value"],
  ["a method", "<TwoCodes a={{ m() {} }} />", 1, 16, "attribute-value"],
  ["a getter", "<TwoCodes a={{ get x() { return 1; } }} />", 1, 16, "attribute-value"],
  ["the prototype as a key", "<TwoCodes a={{ __proto__: 1 }} />", 1, 16, "attribute-value"],
  ["the prototype in quotes", '<TwoCodes a={{ "__proto__": 1 }} />', 1, 16, "attribute-value"],
  ["the constructor as a key", "<TwoCodes a={{ constructor: 1 }} />", 1, 16, "attribute-value"],
  ["a key written twice", "<TwoCodes a={{ x: 1, x: 2 }} />", 1, 22, "attribute-value"],
  ["lists five deep", "<TwoCodes a={[[[[[1]]]]]} />", 1, 18, "attribute-value"],
  ["brackets round a value", `<TwoCodes a={${"(".repeat(90)}1${")".repeat(90)}} />`, 1, 105, "attribute-value"],
  ["more than 200 parts", `<TwoCodes a={[${"1,".repeat(201)}]} />`, 1, 413, "attribute-value"],
  ["a value of 3,000 characters", `<Caution about="${"x".repeat(3000)}" />`, 1, 10, "attribute-value"],
  ["a handler", "<TwoCodes onClick={5} />", 1, 11, "attribute"],
  ["a handler as text", '<Caution about="rf" onError="alert(1)" />', 1, 21, "attribute"],
  ["inner HTML", '<TwoCodes dangerouslySetInnerHTML={{ html: "x" }} />', 1, 11, "attribute"],
  ["children as an attribute", '<TwoCodes children="x" />', 1, 11, "attribute"],
  ["a reference", '<TwoCodes ref="x" />', 1, 11, "attribute"],
  ["a style", '<Caution about="rf" style={{ position: "fixed" }} />', 1, 21, "attribute"],
  ["an attribute with a colon", '<TwoCodes xlink:href="x" />', 1, 11, "attribute"],
  ["an attribute written twice", "<TwoCodes a={5} a={6} />", 1, 17, "attribute"],
  ["a value out of range", "<TwoCodes a={33} />", 1, 11, "attribute-value"],
  ["a value in another unit", '<TwoCodes doppler="1 chip" />', 1, 11, "attribute-value"],
];

const TAGS: Hostile[] = [
  ["a script", "<script>alert(1)</script>", 1, 1, "html"],
  ["a script in capitals", "<SCRIPT>alert(1)</SCRIPT>", 1, 1, "html"],
  ["a frame", '<iframe src="https://a.example" />', 1, 1, "html"],
  ["a style sheet", "<style>p</style>", 1, 1, "html"],
  ["a picture", '<img src="x" onerror="alert(1)" />', 1, 1, "html"],
  ["a form", '<form action="https://a.example"></form>', 1, 1, "html"],
  ["a base", '<base href="https://a.example" />', 1, 1, "html"],
  ["HTML in a sentence", 'A <sub onClick="x">b</sub> c', 1, 3, "html"],
  ["a member name", "<process.env />", 1, 1, "tag"],
  ["a name of every object", "<constructor />", 1, 1, "tag"],
  ["another name of every object", "<toString />", 1, 1, "tag"],
  ["the prototype", "<__proto__ />", 1, 1, "tag"],
  ["a namespace", "<svg:rect />", 1, 1, "tag"],
  ["an unknown tag", "<Danger />", 1, 1, "tag"],
  ["a tag in small letters", '<check id="a" kind="satellites" />', 1, 1, "tag"],
  ["a fragment", "<></>", 1, 1, "fragment"],
  ["a later tag", '<Figure src="a" alt="b" />', 1, 1, "not-available"],
  ["a calculator in a sentence", "Look at <TwoCodes /> here.", 1, 9, "place"],
  ["a calculator in a heading", "# <TwoCodes />", 1, 3, "place"],
  ["a calculator in a table", "| a |\n| - |\n| <TwoCodes /> |", 3, 3, "place"],
  ["a calculator with text inside", "<TwoCodes>\nText.\n</TwoCodes>", 1, 1, "inside"],
  ["a check in a list", '- <Check id="a" kind="satellites">x</Check>', 1, 3, "place"],
  ["a quantity without a check", '<Quantity of="lag" />', 1, 1, "place"],
  ["a tag that is not closed", '<Check id="a" kind="satellites">\n\nText.', 1, 1, "syntax"],
  ["a closing tag alone", "Text.\n\n</Check>", 3, 2, "syntax"],
  ["tags that cross", "<Caution>\n<Check>\n</Caution>\n</Check>", 2, 1, "syntax"],
  ["a tag cut off", '<TwoCodes a="5', 1, 1, "syntax"],
  ["a brace cut off", "Text { and more.\n\nAnd more.", 1, 6, "syntax"],
  ["a value without quotes", "<TwoCodes a=5 />", 1, 13, "syntax"],
  ["an HTML comment", "<!-- <script> -->", 1, 2, "syntax"],
  ["a document type", "<!DOCTYPE html>", 1, 2, "syntax"],
  ["a processing instruction", "<?php echo 1 ?>", 1, 2, "syntax"],
  ["an address in angle brackets", "<https://a.example>", 1, 8, "syntax"],
];

const ADDRESSES: Hostile[] = [
  ["a script address", "[x](javascript:alert(1))", 1, 1, "address"],
  ["the same in mixed case", "[x](JaVaScRiPt:alert(1))", 1, 1, "address"],
  ["the same with an entity", "[x](&#106;avascript:alert(1))", 1, 1, "address"],
  ["the same with a line feed", "[x](java&#x0A;script:alert(1))", 1, 1, "address"],
  ["the same with a tab", "[x](java&Tab;script:alert(1))", 1, 1, "address"],
  ["the same behind a control", "[x](&#1;javascript:alert(1))", 1, 1, "address"],
  ["the same with a joiner", "[x](java\u200bscript:alert(1))", 1, 1, "address"],
  ["another script address", "[x](vbscript:x)", 1, 1, "address"],
  ["a data address", "[x](data:text/html,x)", 1, 1, "address"],
  ["a file", "[x](file:///etc/passwd)", 1, 1, "address"],
  ["another host", "[x](//a.example)", 1, 1, "address"],
  ["another host with backslashes", "[x](\\\\\\\\a.example)", 1, 1, "address"],
  ["another host with both", "[x](/\\\\a.example)", 1, 1, "address"],
  ["plain http", "[x](http://a.example)", 1, 1, "address"],
  ["a definition", "[x]\n\n[x]: javascript:alert(1)", 3, 1, "address"],
  ["a bare address", "See www.a.example now.", 1, 5, "address"],
  ["an address of 600 characters", `[x](https://a.example/${"y".repeat(600)})`, 1, 1, "address"],
  ["a picture from elsewhere", "![x](https://a.example/x.png)", 1, 1, "picture"],
  ["a picture by reference", "![x][r]\n\n[r]: https://a.example/x.png", 1, 1, "picture"],
  ["a link in a formula", "$\\href{javascript:alert(1)}{x}$", 1, 1, "formula"],
  ["a picture in a formula", "Text $\\includegraphics{x}$.", 1, 6, "formula"],
  ["HTML in a formula", "$$\n\\htmlData{a=b}{x}\n$$", 1, 1, "formula"],
  ["a formula that expands without end", "$\\def\\a{\\a\\a}\\a$", 1, 1, "formula"],
  ["a link in a block of formulas", "```math\n\\url{javascript:x}\n```", 1, 1, "formula"],
  ["a formula of 3,000 characters", `$$\n${"a+".repeat(1500)}\n$$`, 1, 1, "formula"],
];

const CHARACTERS: Hostile[] = [
  ["a zero byte", "a\u0000b", 1, 2, "character"],
  ["an escape", "ab\u001b[31m", 1, 3, "character"],
  ["a turned reading direction", "safe \u202eelif", 1, 6, "character"],
  ["half a character", "a\ud800", 1, 2, "character"],
];

const ALL = [...PROGRAM, ...ATTRIBUTES, ...TAGS, ...ADDRESSES, ...CHARACTERS];

describe("a module is refused at the place of the fault", () => {
  test.each(ALL)("%s", async (_what, source, line, column, rule) => {
    const { module, problems } = await readModule(moduleOf(source));
    expect(module).toBeNull();
    expect(problems).toContainEqual(
      expect.objectContaining({ line: FIRST_LINE + line - 1, column, rule, severity: "error" }),
    );
  });

  test("and every message says something a lead can act on", async () => {
    for (const [what, source] of ALL) {
      const { problems } = await readModule(moduleOf(source));
      for (const { message } of problems) {
        expect(message.length, what).toBeGreaterThan(25);
        expect(message, what).toMatch(/^["<A-Z\\a-z$1-9].*\.$/s);
        expect(message, what).not.toMatch(/acorn|micromark|mdast|KaTeX|undefined|\[object/);
      }
    }
  });
});

test("without the fault the module is whole", async () => {
  const { module, problems } = await readModule(
    moduleOf("Text with `{code}`, $\\frac{a}{b}$ and \\{ braces \\}.\n\n{/* a note */}"),
  );
  expect(problems).toEqual([]);
  expect(module?.frontMatter.code).toBe("SBW-X1");
});

test("all faults are listed, not the first one only", async () => {
  const source = [
    "import a from 'b'",
    "",
    "{x}",
    "",
    "<Danger />",
    "",
    "<TwoCodes a={y} b={99} />",
    "",
    "[x](data:y)",
  ].join("\n");
  const { problems } = await readModule(moduleOf(source));
  expect(problems.map(({ line, rule }) => [line - FIRST_LINE + 1, rule])).toEqual([
    [1, "import-export"],
    [3, "expression"],
    [5, "tag"],
    [7, "attribute-value"],
    [7, "attribute-value"],
    [9, "address"],
  ]);
});

test("a fault that stops the parser does not hide the next ones", async () => {
  const source = ["a <5 b", "", "<Danger />", "", "c { d", "", "<TwoCodes a=5 />", "", "[x](data:y)"].join("\n");
  const { problems, tree } = await readModule(moduleOf(source));
  expect(tree).toBeNull();
  expect(problems.map(({ line, rule }) => [line - FIRST_LINE + 1, rule])).toEqual([
    [1, "syntax"],
    [3, "tag"],
    [5, "syntax"],
    [7, "syntax"],
    [9, "address"],
  ]);
});
