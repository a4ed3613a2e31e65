import { expect, test } from "vitest";
import { KINDS } from "@/lib/checks/registry";
import { checkCards } from "@/lib/mdx/checkCards";
import { parseModule } from "@/lib/mdx/parseModule";
import { planChecks } from "@/lib/mdx/planChecks";

function plan(...lines: string[]) {
  const { checks, problems } = parseModule(`<Check id="a" kind="written">\nText.\n${lines.join("\n")}\n</Check>`);
  const read = planChecks(checks, KINDS);
  return { plans: read.plans, problems: [...problems.filter(({ rule }) => rule !== "front-matter"), ...read.problems] };
}
const LINE = '<Quantity id="cause" label="what you think the cause is" critical />';

test("each line is a quantity that a person judges", () => {
  const { plans, problems } = plan(LINE, '<Quantity id="next" label="what you do next" />');
  expect(problems).toEqual([]);
  expect(plans[0]).toMatchObject({
    title: "What you think the cause is and 1 more",
    quantities: [
      { of: "cause", tolerance: null, critical: true },
      { of: "next", tolerance: null, critical: false },
    ],
  });
  expect(checkCards(plans).a?.quantities.map(({ tolerance }) => tolerance)).toEqual(
    Array(2).fill("judged by an assessor"),
  );
});

test.each<[string, string[], number, RegExp]>([
  ["no line", [], 1, /needs a <Quantity>/],
  ["a line twice", [LINE, LINE], 4, /used twice/],
  ["a line without a label", ['<Quantity id="a" />'], 3, /needs label/],
  ["a tolerance", [LINE.replace(" critical", ' tolerance="1 m"')], 3, /tolerance is not read/],
  ["a given", [LINE, '<Given id="L" label="l" unit="m" from={1} to={2} step={1} />'], 4, /nothing is drawn/],
  ["nine lines", Array.from({ length: 9 }, (_, n) => LINE.replace("cause", `l${n}`)), 11, /at most 8 <Quantity>/],
])("%s is refused where it stands", (_what, lines, line, says) => {
  const { problems, plans } = plan(...lines);
  expect(problems[0]).toMatchObject({ line, severity: "error" });
  expect(problems[0]?.message).toMatch(says);
  expect(plans).toEqual([]);
});
