import { describe, expect, test } from "vitest";
import { drawCase } from "@/lib/checks/side-peak/drawCase";
import { biasM, levelDb } from "@/lib/checks/side-peak/readPeaks";
import { sidePeak as kind } from "@/lib/checks/side-peak/sidePeak";
import { peaksOf } from "@/lib/checks/side-peak/solve";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(40).map((seed) => ({ seed, built: kind.build(seed, plan) }));
const trial = kind.trial!;

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
