import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seeds } from "./planOf";
import { caseOf, KINDS_TRIED, rightAnswers } from "./triedCases";

// What holds of every kind that is tried. Wrong methods are held to what they say in leastNeeds.test.ts.
const SEEDS = seeds(12);
const TYPED = ["", "NaN", "1e400", "-0", "1,5", "\u22125", "5 chip", "7 ns", "40 dB", "yes", "none", "L1"];

describe.each(KINDS_TRIED.map((kind) => [kind.id, kind] as const))("%s", (_id, kind) => {
  const { trial } = kind;
  const plan = planOf(kind);
  const cases = SEEDS.map((seed) => ({ seed, built: caseOf(kind, seed) }));

  test("the right method meets its own cases, and each is as hard as is fair", () => {
    for (const { seed, built } of cases) {
      const { rows, met } = trial.judge(built, plan, rightAnswers(kind, built));
      const outside = rows.filter(({ within }) => !within);
      expect(outside, seed).toEqual([]);
      expect(met, seed).toBe(true);
      for (const { label, value, from, to } of trial.difficulty(built, plan))
        expect(value >= from && value <= to, `${seed}: ${label} ${value}`).toBe(true);
    }
  });

  // Right readers fail one case in thirty at most, so one of these dozen may.
  test("careful readers meet them, guesses do not, and the same draws say the same", () => {
    let met = 0;
    for (const { seed, built } of cases) {
      const read = () => trial.read(built, plan, seededRandom(seed, "read"));
      const guess = () => trial.guess(built.publicCase, plan, seededRandom(seed, "guess"));
      expect(read()).toEqual(read());
      expect(guess()).toEqual(guess());
      if (trial.judge(built, plan, read()).met) met++;
      expect(trial.judge(built, plan, guess()).met, seed).toBe(false);
    }
    expect(met).toBeGreaterThanOrEqual(cases.length - 1);
  });

  test("whatever is typed is marked with a sentence, twice alike", () => {
    const { built } = cases[3]!;
    const ids = Object.keys(rightAnswers(kind, built));
    const typed = fc.oneof(fc.string(), fc.double().map(String), fc.constantFrom(...TYPED));
    fc.assert(
      fc.property(fc.array(typed, { minLength: ids.length, maxLength: ids.length }), (texts) => {
        const answers: Answers = Object.fromEntries(ids.map((id, n) => [id, texts[n]!]));
        const marking = trial.judge(built, plan, answers);
        for (const row of marking.rows) if (!row.within) expect(row.reason).toMatch(/[.?]$/);
        expect(JSON.stringify(trial.judge(built, plan, answers))).toBe(JSON.stringify(marking));
      }),
      { numRuns: 25, seed: 7 },
    );
  });
});

// A search kind's own marking takes seconds; it is in its capture test.
const whole = KINDS_TRIED.filter(({ trial }) => trial.whole);
test.each(whole.map((kind) => [kind.id, kind] as const))("%s: seed and answers alone make the marking", (_id, kind) => {
  const [seed, plan] = [SEEDS[5]!, planOf(kind)];
  const built = caseOf(kind, seed);
  const answers = rightAnswers(kind, built);
  const [marking, judged] = [kind.mark(seed, plan, answers), kind.trial.judge(built, plan, answers)];
  // The trial of a plan takes a curve for draws; what is within comes out the same.
  expect([marking.met, marking.quantities]).toEqual([judged.met, judged.quantities]);
  expect(JSON.stringify(kind.mark(seed, plan, answers))).toBe(JSON.stringify(marking));
});
