import { expect, test } from "vitest";
import { moduleLanguage } from "@/app/(work)/[employer]/modules/[id]/_components/moduleLanguage";
import { offersAt } from "@/app/(work)/[employer]/modules/[id]/_components/offersAt";
import { completions } from "@/lib/mdx/completions";

const OFFERS = completions();
const labels = (before: string) => offersAt(OFFERS, before)?.rows.map(({ label }) => label) ?? null;
const HEAD = "---\ncode: SBW-R2\n---\n\n";

test("in the front matter its keys are offered at the beginning of a line only", () => {
  expect(labels("---\ncode: SBW-R2\nva")).toEqual(expect.arrayContaining(["valid", "supervision", "require"]));
  expect(labels("---\ncode: SB")).toBeNull();
});

test("a tag that begins is offered every name, and replaced from its bracket", () => {
  const before = `${HEAD}Slide it.\n<Tw`;
  expect(labels(before)).toEqual(expect.arrayContaining(["<TwoCodes", "<Check", "<Caution"]));
  expect(offersAt(OFFERS, before)!.from).toBe(before.length - 3);
});

test("an open tag is offered its attributes that are not written yet", () => {
  expect(labels(`${HEAD}<TwoCodes a={5} `)).toEqual(expect.arrayContaining(["b", "doppler"]));
  expect(labels(`${HEAD}<TwoCodes a={5} `)).not.toContain("a");
});

test("a check without a kind is offered the kinds, with one the attributes of that kind", () => {
  expect(labels(`${HEAD}<Check id="reading" `)).toContain("correlator-reading");
  const named = labels(`${HEAD}<Check id="plan" kind="search-plan" `)!;
  expect(named).not.toContain("correlator-reading");
  expect(named).toEqual(expect.arrayContaining(OFFERS.kindAttributes["search-plan"]!.map(({ label }) => label)));
});

test("between the tags of a check its kind's quantities come first; after it they are gone", () => {
  const open = `${HEAD}<Check id="reading" kind="correlator-reading" minutes={15}>\nRead it.\n<`;
  expect(labels(open)![0]).toBe(`<Quantity ${OFFERS.quantities["correlator-reading"]![0]!.label}`);
  expect(labels(`${open}/Check>\n\n<`)!.some((label) => label.startsWith("<Quantity "))).toBe(false);
});

test("the lead's own text, a value and a closed tag are left alone", () => {
  for (const text of ["Read it", "a < b and c ", '<TwoCodes doppler="1 k', "<TwoCodes a={5} /> and "])
    expect(labels(HEAD + text)).toBeNull();
});

test("front matter is no heading, and a comment in braces is one", () => {
  const doc = `${HEAD}# Head\n\nText {/* not shown */} goes on.\n`;
  const found: string[] = [];
  moduleLanguage.language.parser.parse(doc).iterate({
    enter: (node) => void found.push(`${node.name} ${doc.slice(node.from, node.to)}`),
  });
  expect(found).toContain("FrontMatter ---\ncode: SBW-R2\n---");
  expect(found).toContain("ModuleComment {/* not shown */}");
  expect(found.filter((name) => name.startsWith("SetextHeading"))).toEqual([]);
});
