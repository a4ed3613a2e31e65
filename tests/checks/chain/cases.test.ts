import { expect, test } from "vitest";
import { chain as kind } from "@/lib/checks/chain/chain";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const trial = kind.trial!;
const cases = seeds(20).map((seed) => ({ seed, built: kind.build(seed, plan) }));

test("few of the possible chains suit a site, and more than one", () => {
  for (const { built } of cases) {
    const { goodChains, possibleChains } = built.truth;
    expect(goodChains).toBeGreaterThanOrEqual(2);
    expect(goodChains).toBeLessThanOrEqual(0.05 * possibleChains);
    for (const { value, from, to } of trial.difficulty(built, plan)) expect(value >= from && value <= to).toBe(true);
  }
});

test("sites keep to what the lead asked", () => {
  for (const splitter of [0, 100]) {
    const own = planOf(kind, { run: [30, 35], neighbour: [-12, -12], splitter });
    for (const seed of seeds(4)) {
      const { site } = kind.build(seed, own).truth;
      expect(site.runM >= 30 && site.runM <= 35).toBe(true);
      expect(site.neighbourDbm).toBe(-12);
      expect(site.needsSplitter).toBe(splitter === 100);
      expect(site.parts.filter(({ kind: part }) => part === "splitter")).toHaveLength(splitter === 100 ? 3 : 0);
    }
  }
});

test.each([
  [5, -50],
  [5, -10],
  [150, -50],
  [150, -10],
])("a run of %i m beside a neighbour of %i dBm can be drawn", (runM, levelDbm) => {
  const own = planOf(kind, { run: [runM, runM], neighbour: [levelDbm, levelDbm] });
  for (const seed of seeds(4)) expect(kind.build(seed, own).draws).toBeLessThan(100);
});

test("the public case holds the site and its parts, and no chain", () => {
  for (const { built } of cases) {
    expect(Object.keys(built.publicCase.data).sort()).toEqual([
      "gainFromDb",
      "gainToDb",
      "limitMa",
      "needsSplitter",
      "neighbourDbm",
      "noiseLimitDb",
      "parts",
      "receiverNoiseDb",
      "runM",
      "sourceOhm",
      "supplyV",
    ]);
    const text = JSON.stringify(built.publicCase);
    expect(text).not.toMatch(/"(best|goodChains|possibleChains|role)"|strong|hungry/);
    expect(text.length).toBeLessThan(12_000);
    // In order of their names, which were dealt at random: the place on the list says nothing.
    const ids = built.truth.site.parts.map(({ id }) => id);
    expect(ids).toEqual([...ids].sort());
  }
  const first = cases.map(({ built }) => built.truth.best.find(({ kind: part }) => part === "amplifier")!.id);
  expect(new Set(first).size).toBeGreaterThan(2);
});
