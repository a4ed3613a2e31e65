import { describe, expect, test } from "vitest";
import { readCapture } from "@/lib/checks/captureFiles";
import { CLASS_CHOICES } from "@/lib/checks/interferer/classes";
import { drawScene } from "@/lib/checks/interferer/drawScene";
import { interferer as kind } from "@/lib/checks/interferer/interferer";
import { markAnswers } from "@/lib/checks/interferer/markAnswers";
import { seededRandom } from "@/lib/numeric/random";
import { planOf, seedOf, seeds } from "../planOf";

const plan = planOf(kind);
const something = planOf(kind, { nothing: 0 });
const built = seeds(14).map((seed) => ({ seed, one: kind.build(seed, something) }));
const empty = kind.build(seedOf(3), planOf(kind, { nothing: 50 }));
const all = [...built, ...[2, 7].map((n) => ({ seed: seedOf(n), one: kind.build(seedOf(n), plan) }))];

test.each(Object.entries(kind.wrongMethods))("%s misses what it says wherever something is there", (_id, wrong) => {
  for (const { seed, one } of built) {
    const { quantities, met } = markAnswers(one.truth, plan, wrong.solve(one, plan));
    const outside = quantities.filter(({ within }) => !within).map(({ of }) => of);
    expect(outside, seed).toEqual(expect.arrayContaining([...wrong.misses]));
    expect(met, seed).toBe(false);
  }
});

describe("scenes", () => {
  const sceneOf = (cls: (typeof CLASS_CHOICES)[number]["value"], n: number) =>
    drawScene(cls, plan.parameters, seededRandom(seedOf(n), cls));
  const numbers = Array.from({ length: 40 }, (_, n) => n);

  test.each(CLASS_CHOICES.map(({ value }) => [value]))("%s stays in its ranges and never clips on the mean", (cls) => {
    for (const n of numbers) {
      const { figures, interferer, sigma, ownLineDb } = sceneOf(cls, n);
      expect(ownLineDb >= -5 && ownLineDb <= 10).toBe(true);
      expect(sigma >= 1.19 && sigma <= 18).toBe(true);
      if (!interferer) {
        expect(figures).toEqual({ centreHz: 0, bandwidthHz: 0, periodS: 0, levelDb: 0 });
        continue;
      }
      expect(Math.sqrt(interferer.power) + 4 * sigma).toBeLessThanOrEqual(127);
      expect(figures.levelDb).toBeGreaterThanOrEqual(9.5);
      expect(figures.levelDb).toBeLessThanOrEqual(35);
      expect(Math.abs(figures.centreHz)).toBeLessThanOrEqual(1.5e6);
      // A mirror image is never within the tolerance of the centre.
      const tolerance = Math.max(1e4, 0.02 * Math.abs(figures.centreHz), 0.02 * figures.bandwidthHz);
      expect(2 * Math.abs(figures.centreHz)).toBeGreaterThan(tolerance * 1.5);
    }
  });

  test("sweeps and pulses keep the ranges of the parameters", () => {
    for (const n of numbers) {
      const sweep = sceneOf("sweep", n).figures.periodS * 1e6;
      expect(sweep >= 8 && sweep <= 200).toBe(true);
      const pulse = sceneOf("pulse", n).interferer!;
      expect(pulse.kind === "pulse" && pulse.onShare >= 0.01 && pulse.onShare <= 0.2).toBe(true);
    }
  });
});

describe("nothing there", () => {
  test("is drawn in about the share that the parameter says", () => {
    const shares = [0, 50].map((nothing) => {
      const first = seeds(200).map((seed) => seededRandom(seed, "interferer@1/case").uniform() * 100 < nothing);
      return first.filter(Boolean).length;
    });
    expect(shares[0]).toBe(0);
    // 100 +- 7 of 200 (binomial); four standard deviations.
    expect(Math.abs(shares[1] - 100)).toBeLessThanOrEqual(28);
  });

  test("the form, the brief and the data are the same as with something there", () => {
    const shapeOf = (one: typeof empty) => ({ ...one.publicCase, data: Object.keys(one.publicCase.data) });
    expect(shapeOf(empty)).toEqual(shapeOf(built[0].one));
  });
});

test("a capture is 8-bit complex samples of the length given, clipped nowhere or nearly", () => {
  for (const { one } of all) {
    const { samples, rateHz } = readCapture(one.files);
    expect(samples).toHaveLength((2 * rateHz * 10) / 1000);
    const ends = samples.filter((value) => Math.abs(value) === 127).length;
    expect(ends / samples.length).toBeLessThan(1e-4);
  }
});

test("the public case says how to read the capture and nothing of what is in it", () => {
  for (const { one } of all) {
    expect(one.publicCase.data).toEqual({ captureFile: "capture.sigmf-data", rateHz: 8_184_000, samples: 81_840 });
    const metadata = new TextDecoder().decode(one.files[0].bytes);
    expect(metadata).toContain("Radiating it is unlawful");
    expect(metadata).not.toMatch(/sweep|pulse|carrier|code|interfer/i);
  }
});
