import { describe, expect, test } from "vitest";
import { standOff as kind } from "@/lib/checks/stand-off/standOff";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(60).map((seed) => ({ seed, one: kind.build(seed, plan) }));

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
