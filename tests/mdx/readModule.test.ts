import { readFile } from "node:fs/promises";
import { expect, test } from "vitest";
import { checkCards } from "@/lib/mdx/checkCards";
import type { ModuleTree, TreeNode } from "@/lib/mdx/moduleTree";
import type { Problem } from "@/lib/mdx/problem";
import { kindOf } from "@/lib/checks/registry";
import { readModule } from "@/lib/mdx/readModule";
import { startingSource } from "@/lib/mdx/startingSource";
import { DELAY, planFrom } from "../checks/formula/plan";
import { SAMPLE_KIND } from "./kinds";
import { FRONT_MATTER, moduleOf, problemsOf } from "./moduleText";

const demonstration = () => readFile("content/modules/sbw-r2.mdx", "utf8");

/** Elements of one name, in the order of the text. */
const elements = (tree: ModuleTree | null, name: string): Extract<TreeNode, { type: "element" }>[] => {
  const within = (node: TreeNode): Extract<TreeNode, { type: "element" }>[] =>
    node.type === "element" ? [...(node.tagName === name ? [node] : []), ...node.children.flatMap(within)] : [];
  return (tree?.children ?? []).flatMap(within);
};

const textOf = (node: TreeNode): string => (node.type === "text" ? node.value : node.children.map(textOf).join(""));

test("a module of the demonstration has no fault and no warning, and requires what its text says", async () => {
  const { module, problems } = await readModule(await demonstration());
  expect(problems).toEqual([]);
  expect(module?.frontMatter).toMatchObject({
    code: "SBW-R2",
    valid: { months: 36 },
    sitting: { days: 30, freshCases: 1, waitHours: 24 },
    require: { all: ["false-lock", "satellites", "plan"], some: { of: ["reading", "cn0", "side-peak"], count: 2 } },
  });
  expect(module?.checks.map(({ id, kind, version, minutes }) => [id, kind, version, minutes])).toEqual([
    ["reading", "correlator-reading", 1, 15],
    ["plan", "search-plan", 1, 40],
    ["satellites", "satellites", 1, 40],
    ["false-lock", "false-lock", 1, 45],
    ["side-peak", "side-peak", 1, 20],
    ["cn0", "cn0", 1, 25],
  ]);
  expect(elements(module?.tree ?? null, "TwoCodes")).toMatchObject([
    { properties: { a: 5, b: 4, doppler: 1000, coherent: 1 }, children: [] },
  ]);
  expect(elements(module?.tree ?? null, "SearchPlan")).toMatchObject([
    { properties: { cn0: 31, sums: 20, window: 5000 } },
  ]);
});

test.each([
  ["sbw-t1", ["sky-view", "chain", "delay-entry", "pulse-acceptance"]],
  ["sbw-i1", ["lost-decibels", "interferer", "stand-off", "jammed-or-not", "locate"]],
])("%s of the demonstration has no fault and no warning", async (name, kinds) => {
  const { module, problems } = await readModule(await readFile(`content/modules/${name}.mdx`, "utf8"));
  expect(problems).toEqual([]);
  expect(module?.checks.map(({ kind }) => kind)).toEqual(kinds);
  expect(module?.frontMatter.require).toEqual({ all: module?.checks.map(({ id }) => id), some: null });
});

test("the text of a new module can be released as it stands, but for its own words", async () => {
  const { problems } = await readModule(startingSource("NEW-1", 'A "new" module: what is this?'));
  expect(problems).toEqual([]);
});

test("the tree is plain data: it survives JSON, and holds neither functions nor null", async () => {
  const { tree } = await readModule(await demonstration());
  expect(JSON.parse(JSON.stringify(tree))).toEqual(tree);
  const kinds = new Set<string>();
  const look = (value: unknown): void => {
    kinds.add(Array.isArray(value) ? "array" : value === null ? "null" : typeof value);
    if (typeof value === "object" && value !== null) Object.values(value).forEach(look);
  };
  look(tree);
  expect([...kinds].sort()).toEqual(["array", "number", "object", "string"]);
});

test("the same text gives the same tree, so that a fingerprint can be taken of it", async () => {
  const source = await demonstration();
  const [first, second] = [await readModule(source), await readModule(source)];
  expect(JSON.stringify(second.module)).toBe(JSON.stringify(first.module));
});

// The part of the printed example of the language that this release has.
test("cautions, text and calculator of the printed example stand on lines of their own without empty lines", async () => {
  const { module, problems } = await readModule(
    moduleOf(
      [
        "# Before you believe the boom",
        '<Caution about="height transmit" />',
        "Slide one code over the other and read the highest side lobe.",
        '<TwoCodes a={5} b={4} doppler="1 kHz" />',
      ].join("\n"),
    ),
  );
  expect(problems).toEqual([]);
  const blocks = module?.tree.children.filter((node) => node.type === "element").slice(-4);
  expect(blocks).toMatchObject([
    { tagName: "h1", children: [{ value: "Before you believe the boom" }] },
    { tagName: "Caution", properties: { about: "height transmit" } },
    { tagName: "p" },
    { tagName: "TwoCodes", properties: { a: 5, b: 4, doppler: 1000 } },
  ]);
});

test("the formula check of the printed example is planned, drawn, solved and marked", async () => {
  const source = [
    '<Check id="delay" kind="formula" minutes={25}>',
    "Work out the delay of the cable on your drawing.",
    '<Given id="L" label="cable length" unit="m" from={8} to={120} step={0.5} />',
    '<Given id="vf" label="velocity factor" unit="1" from={0.66} to={0.88} step={0.01} />',
    '<Quantity id="delay" label="cable delay" unit="ns" answer="L / (vf * c)" tolerance="1 ns" critical />',
    '<Wrong id="air" of="delay" label="speed of light in air" answer="L / c" />',
    "</Check>",
  ].join("\n");
  const { module, problems } = await readModule(moduleOf(source).replace("[reading]", "[reading, delay]"));
  expect(problems).toEqual([]);
  const plan = module!.checks.at(-1)!;
  expect(plan).toEqual(planFrom(DELAY));
  const seed = "5e".repeat(32);
  const kind = kindOf("formula");
  const built = kind.build(seed, plan);
  const { L, vf } = (built.truth as { givens: Record<string, number> }).givens;
  expect(kind.solve(built, plan)["quantities.delay"]).toBe(
    String(Number(((L! / (vf! * 0.299792458)) as number).toPrecision(9))),
  );
  expect(kind.mark(seed, plan, kind.solve(built, plan)).met).toBe(true);
  expect(checkCards([plan]).delay).toMatchObject({
    title: "Cable delay",
    needs: 1,
    quantities: [{ label: "Cable delay", tolerance: "±1\u00a0ns", critical: true }],
  });
  // Its formulas are nowhere in what a technician reads.
  expect(JSON.stringify(module!.tree)).not.toContain("vf");
});

test("the brief of a check is its text; its quantities are in the plan alone", async () => {
  const { module } = await readModule(
    moduleOf(
      '<Check id="b" kind="sample">\nFind **all** of them:\n\n- with $\\tau$\n\n<Quantity of="found" />\n</Check>',
    ).replace("[reading]", "[reading, b]"),
    [...[SAMPLE_KIND], { ...SAMPLE_KIND, id: "correlator-reading" }],
  );
  const brief = elements(module?.tree ?? null, "Check").at(-1);
  expect(brief?.properties).toEqual({ id: "b" });
  expect(brief && textOf(brief)).toMatch(/Find all of them:/);
  expect(elements(module?.tree ?? null, "Quantity")).toEqual([]);
  expect(module?.checks.at(-1)?.quantities.map(({ of }) => of)).toEqual(["found"]);
});

test("a tag with its text on one line is a block and not part of a sentence", async () => {
  const { tree, problems } = await readModule(moduleOf('<Caution about="life">Mind the *gap*.</Caution>'));
  expect(problems).toEqual([]);
  expect(elements(tree, "Caution")).toMatchObject([
    { children: [{ tagName: "p", children: [{ value: "Mind the " }, { tagName: "em" }, { value: "." }] }] },
  ]);
});

test("formulas are set when the module is read, in markup for the eye and for the ear", async () => {
  const { tree } = await readModule(moduleOf("The ratio $C/N_0$ in dB-Hz.\n\n$$\n\\frac{1}{2}\n$$"));
  expect(elements(tree, "math")).toHaveLength(2);
  expect(
    elements(tree, "span").filter(({ properties }) => String(properties.className).includes("katex-display")),
  ).toHaveLength(1);
});

test("headings can be linked to, whatever they say", async () => {
  const { tree } = await readModule(moduleOf("# One\n\n## constructor\n\n# One"));
  const ids = ["h1", "h2"].flatMap((name) => elements(tree, name).map(({ properties }) => properties.id));
  expect(ids).toEqual(["part-1", "part-3", "part-2"]);
});

test("a check that no rule requires is a warning, and the module is released all the same", async () => {
  const { module, problems } = await readModule(moduleOf('<Check id="extra" kind="satellites">\nText.\n</Check>'));
  expect(problems).toMatchObject([{ severity: "warning", rule: "unused", column: 8 }]);
  expect(module?.checks).toHaveLength(2);
});

test("require naming a check that is not there is refused in the front matter", async () => {
  const { module, problems } = await readModule(FRONT_MATTER.replace("[reading]", "[reading, reeding]"));
  expect(module).toBeNull();
  expect(problems).toMatchObject([{ line: 11, column: 27, rule: "require" }]);
  expect(problems[0]?.message).toBe('No check is named "reeding". Checks are reading.');
});

test("while something is wrong the preview shows the rest, without the refused parts", async () => {
  const { module, tree, checks } = await readModule(
    moduleOf("Good {bad} text.\n\n<Danger>kept out</Danger>\n\n[x](javascript:y)\n\n<TwoCodes a={99} b={4} />"),
  );
  expect(module).toBeNull();
  expect(checks.map(({ id }) => id)).toEqual(["reading"]);
  expect(JSON.stringify(tree)).not.toMatch(/bad|kept out|javascript|99/);
  expect(elements(tree, "TwoCodes")).toMatchObject([{ properties: { b: 4 } }]);
});

test("line ends and a byte order mark of any system are read alike", async () => {
  const source = moduleOf("Text.\n\n<Danger />\n");
  const places = async (text: string) =>
    (await readModule(text)).problems.map(({ line, column, rule }) => [line, column, rule]);
  const plain = await places(source);
  expect(plain).toHaveLength(1);
  expect(await places(source.replaceAll("\n", "\r\n"))).toEqual(plain);
  expect(await places(`\uFEFF${source}`)).toEqual(plain);
});

test.each([
  ["{42}", "42"],
  ["{'text'}", "text"],
  ["a {b c} d", "a \\{b c\\} d"],
  ["[x](http://a.example)", "[x](https://a.example)"],
  ["www.a.example", "[www.a.example](https://www.a.example)"],
])("the repair of %s gives %s, and nothing is wrong with that", async (text, repaired) => {
  const [problem] = await problemsOf(text);
  expect(apply(text, problem?.repair)).toBe(repaired);
  expect(await problemsOf(repaired)).toEqual([]);
});

function apply(text: string, repair: Problem["repair"]): string {
  if (!repair) return text;
  // The places of a repair are those of the whole module; here the text is one line.
  return text.slice(0, repair.from.column - 1) + repair.text + text.slice(repair.to.column - 1);
}

test("cards say what is handed in, in the words of the version that the plan names", async () => {
  const { checks } = await readModule(moduleOf('<Check id="b" kind="sample" needs={3}>\nText.\n</Check>'), [
    SAMPLE_KIND,
  ]);
  const newer = { ...SAMPLE_KIND, version: 4, quantities: [] };
  expect(checkCards(checks, [newer, SAMPLE_KIND])).toEqual({
    b: {
      id: "b",
      title: "Read a sample",
      minutes: 20,
      needs: 3,
      quantities: [
        { id: "found", label: "Satellites", tolerance: "exact", critical: true },
        { id: "codePhase", label: "Code phase", tolerance: "±0.5\u00a0chip", critical: false },
        { id: "length", label: "Length", tolerance: "±1\u00a0%", critical: false },
        { id: "bin", label: "Doppler", tolerance: "Half of your own bin.", critical: false },
      ],
    },
  });
});
