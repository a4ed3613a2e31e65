import { describe, expect, test } from "vitest";
import { correlatorReading as kind } from "@/lib/checks/correlator-reading/correlatorReading";
import { drawCase } from "@/lib/checks/correlator-reading/drawCase";
import { markAnswers } from "@/lib/checks/correlator-reading/markAnswers";
import { circularDifference } from "@/lib/checks/circularDifference";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const built = seeds(30).map((seed) => ({ seed, built: kind.build(seed, plan) }));

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

test.each(Object.entries(kind.wrongMethods))("a wrong method does not: %s", (_id, wrong) => {
  for (const { seed, built: one } of built) {
    expect(markAnswers(one.truth, plan, wrong.solve(one, plan)).met, seed).toBe(false);
  }
});

describe("cases that are refused", () => {
  // At C/N0 T of 14 dB noise moves the highest cell further, so some draws have to be refused.
  const faint = seeds(30).map((seed) => drawCase(seed, { ...plan.parameters, cn0T: [14, 14], noiseOnly: 0 }));

  test("are counted", () => expect(Math.max(...faint.map(({ draws }) => draws))).toBeGreaterThan(1));

  test("never reach anybody: the highest cell is near the delay and clear of the threshold", () => {
    for (const { truth } of [...faint, ...built.map(({ built: one }) => one)]) {
      const { reading, lagChips } = truth;
      expect(Math.abs(circularDifference(reading.highestLagChips, lagChips, 1023))).toBeLessThanOrEqual(0.15);
      expect(Math.abs(reading.highest / reading.threshold - 1)).toBeGreaterThan(0.07);
      expect(reading.detected).toBe(truth.signal !== null);
    }
  });

  test("a delay that 1 023 minus itself would match within a chip is none", () => {
    for (const { truth } of [...faint, ...built.map(({ built: one }) => one)]) {
      expect(Math.abs(circularDifference(1023 - truth.lagChips, truth.lagChips, 1023))).toBeGreaterThan(1);
    }
  });
});

test("about one case in five is noise alone", () => {
  const noiseOnly = seeds(100).filter((seed) => drawCase(seed, plan.parameters).truth.signal === null).length;
  // 20 +- 4 expected of 100 draws (binomial); four standard deviations.
  expect(noiseOnly).toBeGreaterThanOrEqual(4);
  expect(noiseOnly).toBeLessThanOrEqual(36);
});

test("delay, PRN and C/N0 T stay in their ranges", () => {
  for (const { built: one } of built) {
    expect(one.truth.prn).toBeGreaterThanOrEqual(1);
    expect(one.truth.prn).toBeLessThanOrEqual(32);
    if (!one.truth.signal) continue;
    expect(one.truth.signal.delayChips).toBeLessThanOrEqual(1022.9);
    expect(one.truth.signal.cn0TDb).toBeGreaterThanOrEqual(16);
    expect(one.truth.signal.cn0TDb).toBeLessThanOrEqual(24);
  }
});

describe("the public case does not show whether there is a signal", () => {
  const shapeOf = (noiseOnly: number) => {
    const { publicCase } = kind.build(seedOf(3), planOf(kind, { noiseOnly, prn: [7, 7] }));
    return JSON.stringify({
      ...publicCase,
      data: { ...publicCase.data, trace: null, coherentMs: null },
      given: publicCase.given.map(({ label }) => label),
    });
  };
  test("form, brief, tolerances and names are the same", () => expect(shapeOf(100)).toBe(shapeOf(0)));

  test("data hold these fields and no other", () =>
    expect(Object.keys(built[0].built.publicCase.data).sort()).toEqual([
      "coherentMs",
      "falseAlarmPerCell",
      "prn",
      "stepChips",
      "trace",
      "traceFile",
    ]));

  test("the file holds lags and magnitudes of the trace", () => {
    const [{ built: one }] = built;
    const lines = new TextDecoder().decode(one.files[0].bytes).split("\r\n");
    expect(lines[0]).toBe("lag_chips,magnitude");
    expect(lines[2]).toBe(`0.125,${one.truth.trace[1].toFixed(4)}`);
    expect(lines).toHaveLength(8184 + 2);
  });
});
