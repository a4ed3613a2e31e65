import { describe, expect, test } from "vitest";
import { searchPlan as kind } from "@/lib/checks/search-plan/searchPlan";
import { drawCase } from "@/lib/checks/search-plan/drawCase";
import { markAnswers } from "@/lib/checks/search-plan/markAnswers";
import { planOf, seeds } from "../planOf";

const SLOW = 120_000;
const plan = planOf(kind);
const built = seeds(20).map((seed) => ({ seed, built: kind.build(seed, plan) }));

test("the right method meets its own cases", { timeout: SLOW }, () => {
  for (const { seed, built: one } of built) {
    const marking = markAnswers(seed, one.truth, plan, kind.solve(one, plan));
    expect(
      marking.rows.filter(({ within }) => !within),
      seed,
    ).toEqual([]);
  }
});

test.each(Object.entries(kind.wrongMethods))("a wrong method does not: %s", { timeout: SLOW }, (_id, wrong) => {
  for (const { seed, built: one } of built) {
    expect(markAnswers(seed, one.truth, plan, wrong.solve(one, plan)).met, seed).toBe(false);
  }
});

test("requirements stay in their ranges", () => {
  for (const { built: one } of built) {
    const { requirement, timeLimitS, reference } = one.truth;
    expect(requirement.cn0DbHz >= 29 && requirement.cn0DbHz <= 36).toBe(true);
    expect(requirement.windowHz >= 3000 && requirement.windowHz <= 12_000).toBe(true);
    expect(requirement.detection >= 0.9 && requirement.detection <= 0.99).toBe(true);
    expect(requirement.falseAlarmPerSearch >= 1e-4 && requirement.falseAlarmPerSearch <= 1e-2).toBe(true);
    // 1.5 to 3 times the fastest plan, rounded up to two figures.
    expect(timeLimitS / reference.timeS).toBeGreaterThanOrEqual(1.5);
    expect(timeLimitS / reference.timeS).toBeLessThanOrEqual(3.3);
  }
});

describe("requirements that are refused", () => {
  // A time limit of 1.2 times the fastest plan leaves few others.
  const tight = { ...plan.parameters, timeFactor: [1.2, 1.2] as const };
  const some = seeds(8).map((seed) => drawCase(seed, tight));
  test("are counted", () => expect(Math.max(...some.map(({ draws }) => draws))).toBeGreaterThan(1));
  test("leave fewer than three plans or more than 60 %; what is left does not", () => {
    for (const { truth } of [...some, ...built.map(({ built: one }) => one)]) {
      expect(truth.passingPlans).toBeGreaterThanOrEqual(3);
      expect(truth.passingPlans).toBeLessThanOrEqual(0.6 * truth.gridPlans);
    }
  });
});

test("the public case holds the requirement and no plan", () => {
  for (const { built: one } of built) {
    expect(Object.keys(one.publicCase.data).sort()).toEqual([
      "cn0DbHz",
      "correlators",
      "detectionPercent",
      "falseAlarmPerSearch",
      "timeLimitS",
      "windowHz",
    ]);
    expect(JSON.stringify(one.publicCase)).not.toContain("reference");
    expect(one.files).toEqual([]);
  }
});
