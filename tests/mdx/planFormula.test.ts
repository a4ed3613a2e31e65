import { describe, expect, test } from "vitest";
import type { FormulaParameters } from "@/lib/checks/formula/parameters";
import { KINDS } from "@/lib/checks/registry";
import { parseModule } from "@/lib/mdx/parseModule";
import { planChecks } from "@/lib/mdx/planChecks";

const GIVEN = '<Given id="L" label="cable length" unit="m" from={8} to={120} step={0.5} />';
const QUANTITY = '<Quantity id="delay" label="cable delay" unit="ns" answer="L / c" tolerance="1 ns" />';

/** What is said of a check with these lines; line 1 is its opening. */
function plan(...lines: string[]) {
  const { checks, problems } = parseModule(`<Check id="a" kind="formula">\nText.\n${lines.join("\n")}\n</Check>`);
  const read = planChecks(checks, KINDS);
  return { plans: read.plans, problems: [...problems.filter(({ rule }) => rule !== "front-matter"), ...read.problems] };
}
const first = (...lines: string[]) => plan(...lines).problems[0];

test("a sound check has no problem", () => expect(plan(GIVEN, QUANTITY).problems).toEqual([]));

describe("a fault in a formula stands at its character", () => {
  test.each([
    ['answer="L / k"', "L / k", 4, /^k is neither/],
    ['answer="L / (c * 2"', "L / (c", 4, /not closed/],
    ["answer={'L // c'}", "L // c", 3, /missing before/],
    ['answer="L + 5"', "L + 5", 2, /cannot be added/],
    ['answer="L"', "L", 0, /works out to a value in m, and the quantity is in ns/],
  ])("%s", (answer, text, offset, says) => {
    const line = QUANTITY.replace('answer="L / c"', answer);
    const found = plan(GIVEN, line).problems;
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ line: 4, column: line.indexOf(text) + 1 + offset, severity: "error" });
    expect(found[0]?.message).toMatch(says);
    expect(plan(GIVEN, line).plans).toEqual([]);
  });

  test("on its second line; where the parser changed the text, at the attribute", () => {
    const two = QUANTITY.replace('"L / c"', '"L /\nk"');
    expect(first(GIVEN, two)).toMatchObject({ line: 5, column: 1 });
    const entity = QUANTITY.replace('"L / c"', '"L &amp; k"');
    expect(first(GIVEN, entity)).toMatchObject({ line: 4, column: entity.indexOf("answer") + 1 });
  });
});

test("a quantity knows the ones before it and not the ones after", () => {
  const second = '<Quantity id="error" label="range" unit="m" answer="delay * c" tolerance="2 %" />';
  expect(plan(GIVEN, QUANTITY, second).problems).toEqual([]);
  expect(first(GIVEN, second, QUANTITY)?.message).toMatch(/^delay is neither a given nor an earlier quantity/);
});

describe("givens", () => {
  const given = (attributes: string) => `<Given id="L" label="length" ${attributes} />`;
  test.each([
    ['unit="m" from={8} to={120} step={0}', /step is above zero/],
    ['unit="m" from={8} to={7} step={1}', /Exchange the two/],
    ['unit="m" from={8} to={120.2} step={0.5}', /the last value is 120\u00a0m\. Write that/],
    ['unit="m" from={0} to={100001} step={1}', /at most 100\u2009000 values/],
    ['unit="m" from={0} to={1} step={1e-10}', /at most 9 figures/],
    ['unit="m" from="8 s" to={120} step={1}', /from cannot be read\. s does not fit/],
    ['unit="furlong" from={8} to={120} step={1}', /unit is one of 1, %/],
    ['unit="m" from={8} to={120}', /needs step/],
    ['unit="m" from={true} to={120} step={1}', /from is a number/],
  ])("%s", (attributes, says) => expect(first(given(attributes), QUANTITY)?.message).toMatch(says));

  test("ends with a unit of their own are turned into the given's", () => {
    const { plans, problems } = plan(given('unit="m" from="0.8 km" to="1 km" step="50 m"'), QUANTITY);
    expect(problems).toEqual([]);
    expect((plans[0]?.parameters as FormulaParameters).givens).toMatchObject([{ from: 800, to: 1000, step: 50 }]);
  });

  test.each(["c", "sqrt"])("the name %s belongs to formulas", (id) =>
    expect(first(GIVEN, QUANTITY.replace("delay", id))?.message).toMatch(/Choose another id/),
  );
  test("one name for one thing", () =>
    expect(first(GIVEN, GIVEN, QUANTITY)).toMatchObject({ line: 4, rule: "own-quantity" }));
  test.each(["2L", "a-b", "__proto__", "x".repeat(25)])("%s is no name", (id) =>
    expect(first(GIVEN, QUANTITY.replace("delay", id))?.message).toMatch(/^id is a letter/),
  );
});

describe("tolerances", () => {
  const with_ = (tolerance: string, unit = "ns", answer = "L / c") =>
    `<Quantity id="q" label="q" unit="${unit}" answer="${answer}" tolerance="${tolerance}" />`;
  test.each([
    ["5 ns", "ns", "L / c", { value: 5, unit: "ns" }],
    ["±0.005 us", "ns", "L / c", { value: 5, unit: "ns" }],
    ["2 %", "ns", "L / c", { value: 2, unit: "%" }],
    ["2 %", "1", "L / L", { value: 2, unit: "%" }],
    ["0.5 dB", "dB", "10 * log10(2)", { value: 0.5, unit: "dB" }],
  ])("%s of a quantity in %s", (tolerance, unit, answer, read) => {
    const { plans, problems } = plan(GIVEN, with_(tolerance, unit, answer));
    expect(problems).toEqual([]);
    expect(plans[0]?.quantities[0]?.tolerance).toEqual(read);
  });
  test.each([
    ["5 m", "ns", "L / c", /m does not fit.*stated in ns or in %/],
    ["0 ns", "ns", "L / c", /must be a number from/],
    ["80 %", "ns", "L / c", /must be a number from 0\.001 to 50 %/],
    ["2 %", "dB", "10 * log10(2)", /stated in dB\./],
  ])("%s of a quantity in %s is refused", (tolerance, unit, answer, says) =>
    expect(first(GIVEN, with_(tolerance, unit, answer))?.message).toMatch(says),
  );
});

test.each<[string, string[], RegExp]>([
  ["no quantity", [GIVEN], /needs a <Quantity>/],
  [
    "no given",
    [QUANTITY.replace('unit="ns"', 'unit="1"').replace("L / c", "pi").replace("1 ns", "1 %")],
    /needs a <Given>/,
  ],
  ["a quantity of the catalogue", [GIVEN, '<Quantity of="lag" />'], /of is not read/],
  ["a wrong way to nothing", [GIVEN, QUANTITY, '<Wrong id="w" label="w" of="length" answer="L" />'], /It has delay\./],
  [
    "a wrong way that is the right one",
    [GIVEN, QUANTITY, '<Wrong id="w" label="w" of="delay" answer="L / c" />'],
    /Hardly any case/,
  ],
  ["a value that cannot be computed", [GIVEN, QUANTITY.replace("L / c", "sqrt(-(L^2)) / c")], /Hardly any case/],
])("%s is refused", (_what, lines, says) => expect(first(...lines)?.message).toMatch(says));

test("a hostile check is planned in short time", () => {
  const long = Array.from({ length: 99 }, () => "L").join("+");
  const givens = Array.from({ length: 30 }, (_, n) => GIVEN.replace('"L"', `"L${n || ""}"`));
  const quantities = Array.from({ length: 30 }, (_, n) =>
    QUANTITY.replace("delay", `q${n}`).replace("L / c", `(${long})/c`),
  );
  const started = performance.now();
  const { problems } = plan(...givens, ...quantities);
  expect(problems.map(({ message }) => message)).toEqual(
    expect.arrayContaining([
      expect.stringMatching(/at most 12 <Given>/),
      expect.stringMatching(/at most 12 <Quantity>/),
    ]),
  );
  expect(performance.now() - started).toBeLessThan(5000);
});

test("the tags of a formula are refused in a check of another kind, each where it stands", () => {
  const { checks } = parseModule(
    `<Check id="a" kind="satellites">\n${GIVEN}\n<Quantity of="found" unit="m" />\n</Check>`,
  );
  expect(planChecks(checks, KINDS).problems.map(({ line, message }) => [line, message.slice(0, 40)])).toEqual(
    expect.arrayContaining([
      [2, '<Given> belongs to checks of kind "formu'],
      [3, 'unit belongs to checks of kind "formula"'],
    ]),
  );
});
