import { describe, expect, test } from "vitest";
import { tolerancesApart } from "@/lib/checks/formula/drawCase";
import { formula as kind } from "@/lib/checks/formula/formula";
import { givenValue, stepsOf } from "@/lib/checks/formula/givenValues";
import { wrongMethodsOf } from "@/lib/checks/definitionsOf";
import type { CheckKind } from "@/lib/checks/kind";
import { seededRandom } from "@/lib/numeric/random";
import { seedOf, seeds } from "../planOf";
import { CHAIN, DELAY, planFrom } from "./plan";

const plan = planFrom(CHAIN);
const cases = seeds(40).map((seed) => ({ seed, built: kind.build(seed, plan) }));

test("the careful solve meets every case, and the case says nothing of formulas or wrong ways", () => {
  for (const { seed, built } of cases) {
    expect(kind.mark(seed, plan, kind.solve(built, plan)).met, seed).toBe(true);
    const shown = JSON.stringify(built.publicCase);
    for (const { answer, label } of CHAIN.wrongs) for (const text of [answer, label]) expect(shown).not.toContain(text);
    for (const { answer } of CHAIN.quantities) expect(shown).not.toContain(answer);
    expect(shown).not.toMatch(/"(truth|right|wrong|seed|answer)"/);
    const told = Object.values(built.truth.right)
      .map(String)
      .filter((text) => text.length > 6);
    for (const text of told) expect(shown).not.toContain(text);
  }
});

test("givens lie on their step, and their text is the very number that is computed with", () => {
  for (const { built } of cases) {
    built.publicCase.given.forEach(({ value }, index) => {
      const { id, from, step } = CHAIN.givens[index]!;
      const shown = Number(
        value
          .replace(/\u2009/g, "")
          .replace("\u2212", "-")
          .split("\u00a0")[0],
      );
      expect(shown).toBe(built.truth.givens[id]);
      expect(Math.abs((shown - from) / step - Math.round((shown - from) / step))).toBeLessThan(1e-6);
    });
  }
});

describe.each(Object.entries(wrongMethodsOf(kind as CheckKind, plan)))("the wrong way %s", (id, wrong) => {
  test("misses what it says and nothing else, and is named", () => {
    for (const { seed, built } of cases) {
      const marking = kind.mark(seed, plan, wrong.solve(built, plan));
      expect(
        marking.quantities.filter(({ within }) => !within).map(({ of }) => of),
        seed,
      ).toEqual(wrong.misses);
      expect(marking.rows.find((row) => !row.within)?.errorClass).toBe(wrong.label);
    }
    expect(CHAIN.wrongs.map((one) => one.id)).toContain(id);
  });
});

test("a case in which a wrong way lands by the right value is drawn again", () => {
  // Of 0 to 10 m of cable in air or not, short ones differ by less than a tolerance of 5 ns.
  const near = planFrom({
    ...DELAY,
    givens: [{ ...DELAY.givens[0]!, from: 0.5, to: 10 }, DELAY.givens[1]!],
    quantities: [{ ...DELAY.quantities[0]!, tolerance: { value: 5, unit: "ns" } }],
  });
  const drawn = seeds(40).map((seed) => kind.build(seed, near));
  expect(Math.max(...drawn.map(({ draws }) => draws))).toBeGreaterThan(1);
  for (const { truth } of drawn)
    expect(tolerancesApart(near.parameters, truth, near.parameters.wrongs[0]!)).toBeGreaterThanOrEqual(1.5);
});

test("a check without a fair case says so and does not run for ever", () => {
  const same = planFrom({ ...DELAY, wrongs: [{ ...DELAY.wrongs[0]!, answer: "L / (vf * c)" }] });
  expect(() => kind.build(seedOf(1), same)).toThrow("no fair case in 1000 draws");
});

test("a step of a tenth is counted in tenths, ends included", () => {
  const given = { id: "x", label: "x", unit: "m" as const, from: -0.3, to: 0.3, step: 0.1 };
  expect(stepsOf(given)).toBe(6);
  expect(Array.from({ length: 7 }, (_, step) => givenValue(given, step))).toEqual([-0.3, -0.2, -0.1, 0, 0.1, 0.2, 0.3]);
  expect(stepsOf({ ...given, to: 0.35 })).toBeNaN();
});

describe("as the release check tries it", () => {
  const trial = kind.trial!;
  const random = seededRandom(seedOf(7), "trial");

  test("the right method as people write it meets it, within the bands of difficulty", () => {
    for (const { built } of cases) {
      expect(trial.judge(built, plan, trial.read(built, plan, random)).met).toBe(true);
      for (const { value, from, to } of trial.difficulty(built, plan)) expect(value >= from && value <= to).toBe(true);
    }
  });

  test("a guess hardly ever does", () => {
    const met = cases.flatMap(({ built }) =>
      Array.from({ length: 10 }, () => trial.judge(built, plan, trial.guess(built.publicCase, plan, random)).met),
    );
    expect(met.filter(Boolean).length).toBeLessThanOrEqual(4); // one in a hundred
  });

  test("judging is marking", () => {
    const { seed, built } = cases[0]!;
    const answers = trial.guess(built.publicCase, plan, random);
    expect(trial.judge(built, plan, answers)).toEqual(kind.mark(seed, plan, answers));
  });
});
