import { expect, test } from "vitest";
import { skyView as kind } from "@/lib/checks/sky-view/skyView";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const trial = kind.trial!;
const cases = seeds(25).map((seed) => ({ seed, built: kind.build(seed, plan) }));

test("the choice is each of the four, and none of them in about as many cases as asked", () => {
  const choices = cases.map(({ built }) => built.truth.choice);
  expect([...new Set(choices)].sort()).toEqual(["A", "B", "C", "none"]);
  const half = planOf(kind, { noneFit: 50 });
  const none = seeds(40).filter((seed) => kind.build(seed, half).truth.choice === "none").length;
  expect(none >= 10 && none <= 30).toBe(true); // 20 of 40; three standard deviations are 9.5
});

test("a lead's own limits are kept", () => {
  const own = planOf(kind, { mask: 15, total: 33, quadrant: 14 });
  for (const seed of seeds(5)) {
    const built = kind.build(seed, own);
    expect(built.publicCase.data).toMatchObject({ maskDeg: 15, totalPercent: 33, quadrantPercent: 14 });
    expect(trial.judge(built, own, kind.solve(built, own)).met).toBe(true);
  }
  expect(kind.parametersProblem!({ ...own.parameters, total: 20 })).toMatchObject({ name: "quadrant" });
  expect(kind.parametersProblem!(plan.parameters)).toBeNull();
});

test("pieces of a horizon go once round, in order", () => {
  for (const { built } of cases)
    for (const { horizon } of built.truth.roof.positions) {
      expect(horizon[0].fromDeg).toBe(0);
      expect(horizon[horizon.length - 1].toDeg).toBe(360);
      for (let n = 1; n < horizon.length; n++) expect(horizon[n].fromDeg).toBe(horizon[n - 1].toDeg);
    }
});

test("the public case holds roof, horizons and limits, and no finding", () => {
  for (const { built } of cases) {
    expect(Object.keys(built.publicCase.data).sort()).toEqual([
      "emitters",
      "hatch",
      "horizonFile",
      "maskDeg",
      "positions",
      "quadrantPercent",
      "totalPercent",
    ]);
    const text = JSON.stringify(built.publicCase) + new TextDecoder().decode(built.files[0].bytes);
    expect(text).not.toMatch(/blockedPercent|"surveyed"|"tightest"|"fits"|walled|sided/);
    expect(text.length).toBeLessThan(12_000);
  }
});

test("every case is as hard as is fair, and the file holds what the screen shows", () => {
  for (const { built } of cases) {
    for (const { value, from, to } of trial.difficulty(built, plan)) expect(value >= from && value <= to).toBe(true);
    const lines = new TextDecoder().decode(built.files[0].bytes).trim().split("\r\n").slice(1);
    const shown = built.truth.roof.positions.flatMap(({ id, horizon }) =>
      horizon.map(({ fromDeg, toDeg, topDeg }) => `${id},${fromDeg},${toDeg},${topDeg}`),
    );
    expect(lines).toEqual(shown);
  }
});
