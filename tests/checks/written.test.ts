import { expect, test } from "vitest";
import { judgeLines } from "@/lib/checks/written/judgeLines";
import type { WrittenParameters } from "@/lib/checks/written/parameters";
import { written } from "@/lib/checks/written/written";
import type { CheckPlan } from "@/lib/checks/kind";
import { planOf, seedOf } from "./planOf";

const plan: CheckPlan<WrittenParameters> = planOf(written, {
  lines: [
    { id: "seen", label: "what you saw", critical: true },
    { id: "done", label: "what you did", critical: false },
  ],
});

test("the case asks for each line and says that a person judges it", () => {
  const { publicCase, truth } = written.build(seedOf(1), plan);
  expect(truth).toEqual({});
  expect(publicCase.sections.flatMap(({ fields }) => fields.map(({ id, longest }) => [id, longest]))).toEqual([
    ["seen", 2000],
    ["done", 2000],
  ]);
  expect(publicCase.tolerances).toMatchObject([
    { quantity: "seen", tolerance: "judged", critical: true },
    { quantity: "done", tolerance: "judged", critical: false },
  ]);
});

test("no machine marks it", () => {
  expect(written.judged).toBe(true);
  expect(written.trial).toBeUndefined();
  expect(() => written.mark(seedOf(1), plan, {})).toThrow(/an assessor judges it/);
});

const verdicts = (seen: boolean, done: boolean) => [
  { of: "done", within: done, reason: "Too little." },
  { of: "seen", within: seen, reason: "Not what was there." },
];

test.each([
  [true, true, null, true],
  [true, false, null, false],
  [true, false, 1, true],
  [false, true, 1, false],
])("seen %s, done %s, %s needed: met %s", (seen, done, needs, met) => {
  const marking = judgeLines({ ...plan, needs }, { "account.seen": "A mast." }, verdicts(seen, done));
  expect(marking.met).toBe(met);
  expect(marking.rows.map(({ quantity, handedIn }) => [quantity, handedIn])).toEqual([
    ["seen", "A mast."],
    ["done", ""],
  ]);
});

test.each([
  ["a missing verdict", verdicts(true, true).slice(1)],
  ["a verdict too many", [...verdicts(true, true), { of: "else", within: true, reason: "" }]],
  [
    "outside without a reason",
    [
      { of: "seen", within: true, reason: "" },
      { of: "done", within: false, reason: " " },
    ],
  ],
])("%s makes no record", (_what, given) => expect(() => judgeLines(plan, {}, given)).toThrow(RangeError));
