import { describe, expect, test } from "vitest";
import { drawScene, mustBeFound } from "@/lib/checks/satellites/drawScene";
import { publicCase } from "@/lib/checks/satellites/publicCase";
import { satellites as kind } from "@/lib/checks/satellites/satellites";
import { planOf, seeds } from "../planOf";

const plan = planOf(kind);
const drawn = seeds(60).map((seed) => drawScene(seed, plan.parameters));

test("scenes stay in their ranges", () => {
  for (const { truth } of drawn) {
    const { satellites, rateHz, durationMs } = truth.scene;
    expect(satellites.length).toBeGreaterThanOrEqual(5);
    expect(satellites.length).toBeLessThanOrEqual(9);
    expect(new Set(satellites.map(({ prn }) => prn)).size).toBe(satellites.length);
    expect([2_046_000, 4_092_000]).toContain(rateHz);
    expect(durationMs).toBe(100);
    expect(truth.windowHz).toBe(9000); // 4 500 Hz of motion and 2.5 ppm of 1 575.42 Hz each: 8 438.6, rounded up
    for (const { prn, codePhaseChips, dopplerHz, cn0DbHz } of satellites) {
      expect(prn >= 1 && prn <= 32).toBe(true);
      expect(codePhaseChips >= 0 && codePhaseChips < 1023).toBe(true);
      expect(cn0DbHz >= 34 && cn0DbHz <= 43).toBe(true);
      // Motion of +-4.5 kHz about a common offset of one ppm = 1 575.42 Hz (definition).
      expect(Math.abs(dopplerHz - truth.clockPpm * 1575.42)).toBeLessThanOrEqual(4500);
      expect(Math.abs(truth.clockPpm)).toBeLessThanOrEqual(2.5);
    }
  }
});

test("both rates and both signs of the clock come up", () => {
  expect(new Set(drawn.map(({ truth }) => truth.scene.rateHz)).size).toBe(2);
  expect(new Set(drawn.map(({ truth }) => Math.sign(truth.clockPpm))).size).toBe(2);
});

test("no satellite is strong enough to raise a false peak that a search of 4 ms x 20 finds", () => {
  // The worst pair of codes at whole kHz is 21.1 dB down (Kaplan & Hegarty, Understanding GPS, 2nd ed., from memory);
  // 24 dB-Hz is found with a probability of 0.02 (computed before this code was written).
  for (const { truth } of drawn)
    for (const { cn0DbHz } of truth.scene.satellites) expect(cn0DbHz - 21.1).toBeLessThan(24);
});

describe("scenes that are refused", () => {
  const scarce = { ...plan.parameters, satellites: [4, 4] as const, cn0: [32, 37] as const };
  const some = seeds(20).map((seed) => drawScene(seed, scarce));
  test("are counted", () => expect(Math.max(...some.map(({ draws }) => draws))).toBeGreaterThan(1));
  test("hold fewer than three satellites that must be found; what is left holds three", () => {
    for (const { truth } of some)
      expect(truth.scene.satellites.filter(mustBeFound(truth)).length).toBeGreaterThanOrEqual(3);
  });
});

test("parameters that leave nothing to be found are named before a release", () => {
  expect(kind.parametersProblem?.(plan.parameters)).toBeNull();
  expect(kind.parametersProblem?.({ ...plan.parameters, cn0: [32, 36.5] })).toMatchObject({ name: "foundFrom" });
});

test("the public case depends on the sample rate and on nothing else of the scene", () => {
  const texts = new Map<number, string>();
  for (const { truth } of drawn) {
    const text = JSON.stringify(publicCase(truth, plan));
    expect(texts.get(truth.scene.rateHz) ?? text).toBe(text);
    texts.set(truth.scene.rateHz, text);
  }
});
