import { describe, expect, test } from "vitest";
import { drawCase } from "@/lib/checks/side-peak/drawCase";
import { markAnswers } from "@/lib/checks/side-peak/markAnswers";
import { biasM, levelDb } from "@/lib/checks/side-peak/readPeaks";
import { sidePeak as kind } from "@/lib/checks/side-peak/sidePeak";
import { peaksOf } from "@/lib/checks/side-peak/solve";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(40).map((seed) => ({ seed, built: kind.build(seed, plan) }));
const trial = kind.trial!;

test("the right method meets its own cases", () => {
  for (const { seed, built: one } of built) {
    const marking = markAnswers(one.truth, plan, kind.solve(one, plan));
    expect(
      marking.rows.filter(({ within }) => !within),
      seed,
    ).toEqual([]);
    expect(marking.met, seed).toBe(true);
  }
});

test.each(Object.entries(kind.wrongMethods))("a wrong method misses what it says: %s", (_id, wrong) => {
  for (const { seed, built: one } of built) {
    const marking = markAnswers(one.truth, plan, wrong.solve(one, plan));
    expect(marking.met, seed).toBe(false);
    for (const { of, within } of marking.quantities) if (wrong.misses.includes(of)) expect(within, seed).toBe(false);
  }
});

test("seed and answers alone make the marking", () => {
  for (const { seed, built: one } of built.slice(0, 5)) {
    const answers = kind.solve(one, plan);
    expect(JSON.stringify(kind.mark(seed, plan, answers))).toBe(JSON.stringify(trial.judge(one, plan, answers)));
  }
});

test("all three locks occur, about a third of them on the main peak", () => {
  const locks = seeds(120).map((seed) => drawCase(seed, plan.parameters).truth.tracked);
  // 42 +- 5 of 120 draws at 35 % (binomial); four standard deviations.
  const mainShare = locks.filter((one) => one === "main").length;
  expect(mainShare).toBeGreaterThanOrEqual(21);
  expect(mainShare).toBeLessThanOrEqual(63);
  expect(new Set(locks)).toEqual(new Set(["main", "earlier", "later"]));
});

test("no case is refused for good, and refused draws are counted", () => {
  const counts = built.map(({ built: one }) => one.draws);
  expect(Math.max(...counts)).toBeGreaterThan(1);
  expect(Math.max(...counts)).toBeLessThan(60);
});

test("what reaches people can be read, and a formula without reading is wrong", () => {
  for (const { built: one } of built) {
    const read = peaksOf(one.publicCase);
    const levels = (["earlier", "later"] as const).map((side) => {
      expect(Math.abs(biasM(read, side) - biasM(one.truth.peaks, side))).toBeLessThanOrEqual(2.5);
      return levelDb(one.truth.peaks, side);
    });
    expect(Math.max(...levels.map((level) => Math.abs(level - 6.0206)))).toBeGreaterThan(0.99);
    for (const { label, value, from, to } of trial.difficulty(one, plan))
      expect(value >= from && value <= to, label).toBe(true);
  }
});

describe("the public case does not show which peak is tracked", () => {
  const shapeOf = (mainShare: number) => {
    const { publicCase } = kind.build(seedOf(3), planOf(kind, { mainShare }));
    return JSON.stringify({
      ...publicCase,
      data: Object.keys(publicCase.data),
      given: publicCase.given.map(({ label }) => label),
    });
  };
  test("form, brief, tolerances and names are the same", () => expect(shapeOf(60)).toBe(shapeOf(0)));

  test("data hold these fields and no other", () =>
    expect(Object.keys(built[0].built.publicCase.data).sort()).toEqual([
      "fromChips",
      "stepChips",
      "trace",
      "traceFile",
      "trackedLagChips",
    ]));

  test("the tracked lag stands at no fixed place of the trace", () => {
    const places = built.map(({ built: { truth } }) => truth.trackedLagChips - truth.fromChips);
    expect(Math.max(...places) - Math.min(...places)).toBeGreaterThan(0.2);
  });

  test("the file holds lags and magnitudes of the trace", () => {
    const [{ built: one }] = built;
    const lines = new TextDecoder().decode(one.files[0].bytes).split("\r\n");
    expect(lines[0]).toBe("lag_chips,magnitude");
    expect(lines[2]).toBe(`${(one.truth.fromChips + 0.005).toFixed(3)},${one.truth.trace[1].toFixed(3)}`);
    expect(lines).toHaveLength(721 + 2);
  });
});

test("people read within the tolerances, guesses do not meet it", () => {
  let [read, guessed] = [0, 0];
  for (const { seed, built: one } of built) {
    const random = seededRandom(seed, "trial");
    if (trial.judge(one, plan, trial.read(one, plan, random)).met) read++;
    for (let n = 0; n < 10; n++) if (trial.judge(one, plan, trial.guess(one.publicCase, plan, random)).met) guessed++;
  }
  expect(read).toBeGreaterThanOrEqual(39);
  expect(guessed).toBeLessThanOrEqual(4);
});
