import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { markAnswers } from "@/lib/checks/stand-off/markAnswers";
import { standOff as kind } from "@/lib/checks/stand-off/standOff";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(60).map((seed) => ({ seed, one: kind.build(seed, plan) }));

test("the right method meets its own cases", () => {
  for (const { seed, one } of built) {
    const marking = markAnswers(one.truth, plan, kind.solve(one, plan));
    expect(
      marking.rows.filter(({ within }) => !within),
      seed,
    ).toEqual([]);
    expect(marking.met).toBe(true);
  }
});

test.each(Object.entries(kind.wrongMethods))("%s misses what it says in every case", (_id, wrong) => {
  for (const { seed, one } of built) {
    const { quantities, met } = markAnswers(one.truth, plan, wrong.solve(one, plan));
    const outside = quantities.filter(({ within }) => !within).map(({ of }) => of);
    expect(outside, seed).toEqual(expect.arrayContaining([...wrong.misses]));
    expect(met, seed).toBe(false);
  }
});

test("a site is drawn from what the parameters say", () => {
  for (const { one } of built) {
    const { site, recoveryM, effectiveDbHz } = one.truth;
    expect([1, 2, 5, 10, 20, 50, 100, 200, 500, 1000]).toContain(site.eirpMw);
    expect([2, 2.5, 3, 3.5, 4]).toContain(site.exponent);
    expect(site.antennaGainDb).toBeLessThanOrEqual(-4);
    for (const { cn0DbHz } of site.satellites) expect(cn0DbHz >= 36 && cn0DbHz <= 50).toBe(true);
    // The receiver is out of work now and works again farther off.
    expect(effectiveDbHz.filter((value) => value >= site.thresholdDbHz).length).toBeLessThan(4);
    expect(recoveryM).toBeGreaterThan(site.distanceM);
  }
});

test("sites that a wrong method would come through are refused and counted", () => {
  // At exponent 4 the antenna's 3 dB move the distance by 19 %, and neighbours in C/N0 are near each other.
  const tight = { ...plan.parameters, exponent: [4, 4] as const, antennaGain: [-3, -3] as const };
  const draws = seeds(40).map((seed) => kind.build(seed, { ...plan, parameters: tight }).draws);
  expect(Math.max(...draws)).toBeGreaterThan(1);
});

describe("trial", () => {
  test("reading with roundings meets, guesses do not, difficulty is in its bands", () => {
    const trial = kind.trial!;
    for (const { seed, one } of built) {
      expect(trial.judge(one, plan, trial.read(one, plan, seededRandom(seed, "read"))).met, seed).toBe(true);
      const guess = trial.guess(one.publicCase, plan, seededRandom(seed, "guess"));
      expect(Object.keys(guess).sort()).toEqual(Object.keys(kind.solve(one, plan)).sort());
      expect(trial.judge(one, plan, guess).met).toBe(false);
      for (const { value, from, to } of trial.difficulty(one, plan)) expect(value >= from && value <= to).toBe(true);
    }
  });
});

test("the public case holds what is given and nothing that follows from it", () => {
  for (const { one } of built) {
    expect(Object.keys(one.publicCase.data).sort()).toEqual([
      ...["antennaGainDb", "distanceM", "eirpMw", "exponent", "interference"],
      ...["noiseDensityDbmHz", "satellites", "screenDb", "thresholdDbHz"],
    ]);
    const text = JSON.stringify(one.publicCase);
    for (const value of [one.truth.receivedDbm, one.truth.recoveryM, ...one.truth.effectiveDbHz])
      expect(text).not.toContain(value.toPrecision(6));
  }
});

test("whatever is typed is marked, twice alike", () => {
  const { one } = built[3];
  const ids = Object.keys(kind.solve(one, plan));
  const typed = fc.oneof(
    fc.string(),
    fc.double().map(String),
    fc.constantFrom("", "NaN", "1e400", "-0", "1,5", "\u22125", "5 chip"),
  );
  fc.assert(
    fc.property(fc.array(typed, { minLength: ids.length, maxLength: ids.length }), (texts) => {
      const answers: Answers = Object.fromEntries(ids.map((id, n) => [id, texts[n]]));
      const marking = markAnswers(one.truth, plan, answers);
      for (const row of marking.rows) if (!row.within) expect(row.reason).toMatch(/[.?]$/);
      expect(JSON.stringify(markAnswers(one.truth, plan, answers))).toBe(JSON.stringify(marking));
    }),
    { numRuns: 60, seed: 7 },
  );
});

test("marking draws the case again from its seed", () => {
  const { seed, one } = built[5];
  const answers = kind.solve(one, plan);
  expect(kind.mark(seed, plan, answers)).toEqual(markAnswers(one.truth, plan, answers));
  expect(kind.mark(seedOf(6), plan, answers).met).toBe(false);
});
