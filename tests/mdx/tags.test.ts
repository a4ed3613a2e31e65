import { expect, test } from "vitest";
import { CAUTIONS } from "@/components/mdx/cautions";
import { components } from "@/components/mdx/components";
import { KINDS } from "@/lib/checks/registry";
import { completions } from "@/lib/mdx/completions";
import { parseModule } from "@/lib/mdx/parseModule";
import { planChecks } from "@/lib/mdx/planChecks";
import { CAUTION_TOPICS, LANGUAGE_KINDS, LATER_TAGS, TAGS } from "@/lib/mdx/tags";

test("every tag has its component and every component its tag", () => {
  expect(Object.keys(components).sort()).toEqual(Object.keys(TAGS).sort());
  expect(Object.entries(TAGS).filter(([name, tag]) => tag.name !== name)).toEqual([]);
});

test("every caution topic has its text and every text its topic", () => {
  expect(Object.keys(CAUTIONS).sort()).toEqual([...CAUTION_TOPICS].sort());
});

test("what the language has later is not offered now", () => {
  expect(LATER_TAGS.filter((name) => Object.hasOwn(TAGS, name))).toEqual([]);
});

test.each([...LATER_TAGS])("<%s> is refused as not available", (name) => {
  const { problems } = parseModule(`Text.\n\n<${name} />`);
  expect(problems.at(-1)).toMatchObject({ line: 3, column: 1, rule: "not-available" });
});

test("every kind is one that the language names", () =>
  expect(KINDS.map(({ id }) => id).filter((id) => !LANGUAGE_KINDS.includes(id))).toEqual([]));

const LATER_KINDS = LANGUAGE_KINDS.filter((id) => !KINDS.some((kind) => kind.id === id));

test.each(LATER_KINDS)("the kind %s is refused as not available", (kind) => {
  const { checks } = parseModule(`<Check id="a" kind="${kind}">x</Check>`);
  expect(planChecks(checks, KINDS).problems[0]?.message).toMatch(/not available in this release/);
});

test("what the editor offers can be written as it is", () => {
  const offers = completions();
  for (const { label, insert } of offers.tags) {
    // What stands inside a check, and the check that it needs, are tried kind by kind.
    if (label === "Check" || TAGS[label as keyof typeof TAGS].place === "check") continue;
    expect(parseModule(`Text.\n\n${insert}`).problems.filter(({ rule }) => rule !== "front-matter")).toEqual([]);
  }
  for (const kind of KINDS) {
    const attributes = offers.kindAttributes[kind.id]?.map(({ insert }) => insert).join(" ");
    const inside = kind.ofPlan ? offers.ownTags[kind.id] : offers.quantities[kind.id];
    const quantities = inside?.map(({ insert }) => insert).join("\n");
    const { checks, problems } = parseModule(`<Check id="a" kind="${kind.id}" ${attributes}>\n${quantities}\n</Check>`);
    const plan = planChecks(checks, KINDS);
    expect([...problems, ...plan.problems].filter(({ rule }) => rule !== "front-matter")).toEqual([]);
    expect(plan.plans[0]?.quantities.length).toBeGreaterThan(0);
    if (kind.ofPlan) continue;
    expect(plan.plans[0]?.parameters).toEqual(
      Object.fromEntries(kind.parameters.map(({ name, default: value }) => [name, value])),
    );
  }
});

test("the front matter that the editor offers line by line is a whole one", () => {
  const lines = completions().frontMatter.map(({ insert }) => insert);
  expect(parseModule(`---\n${lines.join("\n")}\n---\n`).problems).toEqual([]);
});
