import { expect, test } from "vitest";
import type { Marking } from "@/lib/checks/kind";
import { attain, attainQuickly } from "@/lib/checks/search-plan/attain";
import { searchPlan as kind } from "@/lib/checks/search-plan/searchPlan";
import { trial } from "@/lib/checks/search-plan/trial";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const cases = seeds(3).map((seed) => ({ seed, built: trial.build(seed, plan), random: seededRandom(seed, "trial") }));

test("people who plan with care meet it, each with a plan of their own; blind guesses do not", () => {
  for (const { seed, built, random } of cases) {
    expect(trial.judge(built, plan, trial.read(built, plan, random)).met, seed).toBe(true);
    for (let n = 0; n < 3; n++)
      expect(trial.judge(built, plan, trial.guess(built.publicCase, plan, random)).met, seed).toBe(false);
    for (const { label, value, from, to } of trial.difficulty(built, plan))
      expect(value >= from && value <= to, `${seed} ${label} ${value}`).toBe(true);
  }
});

test("judges as the marking does, but for the workings and the last figures of a gauge", () => {
  const [{ seed, built }] = cases;
  const answers = kind.solve(built, plan);
  const printed = ({ rows, ...rest }: Marking) => ({
    ...{ ...rest, workings: [] },
    rows: rows.map((row) => ({ ...row, offByTolerances: row.offByTolerances?.toFixed(4) })),
  });
  expect(printed(trial.judge(built, plan, answers))).toEqual(printed(kind.mark(seed, plan, answers)));
});

test("the quick detection is that of the draws", () => {
  const [{ seed, built }] = cases;
  const set = { coherentMs: 4, sums: 10, dopplerBinHz: 125, codeStepChips: 0.5, thresholdSigma2: 70 };
  const [slow, quick] = [attain, attainQuickly].map((way) => way(seed, built.truth, set));
  expectNear(quick.detection, slow.detection, 1e-6, "detection");
  expect([quick.cells, quick.falseAlarmPerSearch, quick.searchTimeS]).toEqual([
    slow.cells,
    slow.falseAlarmPerSearch,
    slow.searchTimeS,
  ]);
});

test("a case that was not built here has no seed to be judged with", () => {
  const built = kind.build(cases[0].seed, plan);
  expect(() => trial.judge(built, plan, {})).toThrow(/own build/);
});
