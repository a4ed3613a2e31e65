import { expect, test } from "vitest";
import { correlatorReading as kind } from "@/lib/checks/correlator-reading/correlatorReading";
import { trial } from "@/lib/checks/correlator-reading/trial";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const cases = seeds(20).map((seed) => ({ seed, built: trial.build(seed, plan), random: seededRandom(seed, "trial") }));

test("nearly every careful reader meets it, and reads with an error of their own", () => {
  const read = cases.map(({ built, random }) => trial.read(built, plan, random));
  const met = read.filter((answers, n) => trial.judge(cases[n].built, plan, answers).met).length;
  expect(met).toBeGreaterThanOrEqual(18);
  const own = read.filter(
    (answers, n) => answers["reading.noiseMean"] !== kind.solve(cases[n].built, plan)["reading.noiseMean"],
  );
  expect(own.length).toBeGreaterThan(10);
});

test("blind guesses do not, and no case is outside its bands", () => {
  for (const { seed, built, random } of cases) {
    for (let n = 0; n < 5; n++)
      expect(trial.judge(built, plan, trial.guess(built.publicCase, plan, random)).met, seed).toBe(false);
    for (const { label, value, from, to } of trial.difficulty(built, plan))
      expect(value >= from && value <= to, `${seed} ${label} ${value}`).toBe(true);
  }
});

test("judges as the marking does", () => {
  const built = trial.build(seedOf(7), plan);
  const answers = { ...kind.solve(built, plan), "reading.lag": "100" };
  expect(trial.judge(built, plan, answers)).toEqual(kind.mark(seedOf(7), plan, answers));
});
