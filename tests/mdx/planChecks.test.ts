import { describe, expect, test } from "vitest";
import { KINDS } from "@/lib/checks/registry";
import { parseModule } from "@/lib/mdx/parseModule";
import { planChecks } from "@/lib/mdx/planChecks";
import { SAMPLE_KIND } from "./kinds";

const plan = (source: string) => planChecks(parseModule(source).checks, [SAMPLE_KIND]);
const check = (attributes: string, inside = "Text.") =>
  plan(`<Check id="a" kind="sample"${attributes}>\n${inside}\n</Check>`);
const faults = (found: ReturnType<typeof plan>) =>
  found.problems.map(({ line, column, rule, message }) => [line, column, rule, message]);

test("what is not written is filled in from the kind, with its version", () => {
  expect(check("")).toEqual({
    problems: [],
    plans: [
      {
        id: "a",
        kind: "sample",
        version: 3,
        title: "Read a sample",
        minutes: 20,
        needs: null,
        parameters: { cn0: [34, 43], window: 5000, format: "ci8" },
        quantities: [
          { of: "found", tolerance: null, critical: true },
          { of: "codePhase", tolerance: { value: 0.5, unit: "chip" }, critical: false },
          { of: "length", tolerance: { value: 1, unit: "%" }, critical: false },
          { of: "bin", tolerance: null, critical: false },
        ],
      },
    ],
  });
});

test("what is written is read in the units of the kind", () => {
  const { plans, problems } = check(
    ' minutes={45} needs={2} cn0={[30, 40]} window="1.5 kHz" format="ci16"',
    '<Quantity of="found" critical={false} />\n<Quantity of="codePhase" tolerance="±0.25 chip" critical />',
  );
  expect(problems).toEqual([]);
  expect(plans[0]).toMatchObject({
    minutes: 45,
    needs: 2,
    parameters: { cn0: [30, 40], window: 1500, format: "ci16" },
    quantities: [
      { of: "found", critical: false },
      { of: "codePhase", tolerance: { value: 0.25, unit: "chip" }, critical: true },
    ],
  });
});

test("a tolerance in another unit is refused with the kind's own as repair", () => {
  const found = check("", '<Quantity of="found" />\n<Quantity of="codePhase" tolerance="0.5 Hz" />');
  expect(faults(found)).toEqual([
    [
      3,
      26,
      "tolerance",
      "Tolerance is in Hz, but this quantity is in chip. Nothing handed in could be compared with it.",
    ],
  ]);
  expect(found.problems[0]?.repair).toEqual({
    label: "Write “0.5 chip”",
    text: 'tolerance="0.5 chip"',
    from: { line: 3, column: 26 },
    to: { line: 3, column: 44 },
  });
});

test("a tolerance that is a share is not mistaken for the quantity's unit", () => {
  const [fault] = check("", '<Quantity of="found" />\n<Quantity of="length" tolerance="5 m" />').problems;
  expect(fault?.message).toBe("Tolerance is in m, but that of this quantity is a share of it, in %.");
});

test.each([
  ['tolerance="3 chip"', /must be a number from 0\.1 to 2 chip/],
  ['tolerance="0 chip"', /must be a number from 0\.1 to 2 chip/],
  ["tolerance={-1}", /must be a number from 0\.1 to 2 chip/],
  ['tolerance="0.5 parsec"', /not a unit known here/],
  ['tolerance="half a chip"', /not a number/],
])("the tolerance %s is refused", (written, says) => {
  const found = check("", `<Quantity of="found" />\n<Quantity of="codePhase" ${written} />`);
  expect(found.problems).toMatchObject([{ line: 3, column: 26, rule: "tolerance" }]);
  expect(found.problems[0]?.message).toMatch(says);
});

test("a bare tolerance is in the unit of the kind", () => {
  const { plans } = check("", '<Quantity of="found" />\n<Quantity of="codePhase" tolerance={1} />');
  expect(plans[0]?.quantities[1]?.tolerance).toEqual({ value: 1, unit: "chip" });
});

test("a quantity that is judged exactly takes no tolerance, and the repair takes it away", () => {
  const found = check("", '<Quantity of="found" tolerance="1 chip" />');
  expect(found.problems).toMatchObject([{ rule: "tolerance", repair: { text: "" } }]);
});

test("quantities are named once and by names of the kind", () => {
  const found = check("", '<Quantity of="found" />\n<Quantity of="found" />\n<Quantity of="fond" />');
  expect(faults(found).map(([line, column, rule]) => [line, column, rule])).toEqual([
    [3, 11, "quantity"],
    [4, 11, "quantity"],
  ]);
  expect(found.problems[1]?.message).toContain("found, codePhase, length, bin");
});

test("leaving out a critical quantity is allowed and said", () => {
  const found = check("", '<Quantity of="codePhase" />');
  expect(found.plans[0]?.quantities.map(({ of }) => of)).toEqual(["codePhase"]);
  expect(found.problems).toMatchObject([{ severity: "warning", rule: "quantity" }]);
});

test("more needed than there are could never be met", () => {
  expect(faults(check(" needs={5}"))).toEqual([
    [1, 29, "check", "This check has 4 quantities, so needs={5} could never be met. Write 4 or fewer."],
  ]);
});

describe("a check of a real kind", () => {
  const written = (kind: string, attributes: string, inside = "Text.") =>
    planChecks(parseModule(`<Check id="a" kind="${kind}"${attributes}>\n${inside}\n</Check>`).checks, KINDS).problems;
  const METHOD = "Sky plot and report believed, capture not searched";

  test("is refused when it needs so few that a known wrong method meets it", () => {
    const message = `With needs={4} this check would be met by a known wrong method: ${METHOD}. Write 6 or more, or make "falseDoppler" critical.`;
    expect(written("false-lock", " needs={4}")).toMatchObject([{ line: 1, column: 33, rule: "check", message }]);
    expect(written("false-lock", " needs={6}")).toEqual([]);
    expect(written("false-lock", "")).toEqual([]);
  });

  test("may need fewer where what the wrong methods miss is critical", () => {
    const all = ["verdict", "parent", "falseDoppler", "falseCn0", "test", "remedy"];
    const tags = (critical: string[]) =>
      all.map((of) => `<Quantity of="${of}"${critical.includes(of) ? " critical" : ""} />`).join("\n");
    const attributes = " needs={4}";
    expect(written("false-lock", attributes, tags(["verdict", "falseDoppler", "test"]))).toEqual([]);
    const [fault] = written("false-lock", attributes, tags(["verdict", "falseDoppler"]));
    expect(fault?.message).toContain('Called multipath. Write 5 or more, or make "test" or "remedy" critical.');
  });

  // Satellites must be found from 36 dB-Hz on unless the lead says otherwise; the range has to reach 1 dB above.
  test.each([
    [' cn0="32 to 36.5 dB-Hz"', 1],
    [' foundFrom="42 dB-Hz" cn0="34 to 42 dB-Hz"', 33],
  ])("is refused with parameters that no case can be drawn from:%s", (attributes, column) => {
    const [fault, ...more] = written("satellites", attributes);
    expect(more).toEqual([]);
    expect(fault).toMatchObject({ line: 1, rule: "attribute-value", severity: "error" });
    expect(fault?.message).toBe("C/N0 must reach at least 1 dB above the level from which satellites must be found.");
    // At the attribute that is named, or at the tag where it is not written.
    expect(fault?.column).toBe(column);
  });
});

test.each([
  [" cn0={[43, 34]}", /smaller/],
  [" cn0={[10, 34]}", /20/],
  [" cn0={[34]}", /range/],
  [" window={-1}", /0/],
  [' window="1 s"', /Hz/],
  [' format="cf32"', /ci8, ci16/],
  [" colour={3}", /colour/],
])("the parameter%s is refused at its place", (written, says) => {
  const [fault] = check(written).problems;
  expect(fault).toMatchObject({ line: 1, column: 29, severity: "error" });
  expect(fault?.message).toMatch(says);
});

test.each([
  ["sampel", /"sampel" is not a kind of check\. Kinds are sample\./],
  ["witnessed", /not available in this release/],
])("the kind %s is refused", (kind, says) => {
  const [fault] = plan(`<Check id="a" kind="${kind}">x</Check>`).problems;
  expect(fault).toMatchObject({ line: 1, column: 15, rule: "check" });
  expect(fault?.message).toMatch(says);
});

test("two checks of one name are refused at the second", () => {
  const one = '<Check id="a" kind="sample">x</Check>\n\n';
  expect(plan(one + one).problems).toMatchObject([{ line: 3, column: 8, rule: "check" }]);
});

test("more than twelve checks are refused at the thirteenth", () => {
  const many = Array.from({ length: 13 }, (_, n) => `<Check id="c${n}" kind="sample">x</Check>\n\n`).join("");
  expect(plan(many).problems).toMatchObject([{ line: 25, column: 1, rule: "check" }]);
});

test.each([4, 241, 30.5])("%d minutes are refused", (minutes) => {
  const { problems } = parseModule(`<Check id="a" kind="sample" minutes={${minutes}}>x</Check>`);
  expect(problems.at(-1)).toMatchObject({ line: 1, column: 29, rule: "attribute-value" });
});
