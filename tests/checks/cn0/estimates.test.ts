import { describe, expect, test } from "vitest";
import { drawPrompts, drawSteady } from "@/lib/checks/cn0/drawPrompts";
import { cutThroughBits, estimateCn0, noiseAveragedInDb, residualLeftIn } from "@/lib/checks/cn0/estimates";
import { seededRandom } from "@/lib/numeric/random";
import { mean, standardDeviation } from "@/lib/numeric/statistics";
import { expectNear } from "@/tests/support/expectNear";

const random = seededRandom("e".repeat(64), "estimates");
const RUNS = 60;
const runs = (cn0DbHz: number, residualHz: number) =>
  Array.from({ length: RUNS }, () => {
    const channel = drawPrompts(drawSteady(cn0DbHz, random), residualHz, random);
    return { ...channel, estimate: estimateCn0(channel.prompts)! };
  });

// Scatter over 1 s is 0.15 dB at 42 and 0.31 dB at 27 dB-Hz, from a second program, 400 runs each; over 2 s the root of two
// less. The standard deviation of 60 runs is good to 9 %; four of them.
describe.each([
  [27, 0.22],
  [42, 0.106],
])("narrow over wide power at %d dB-Hz", (cn0DbHz, scatterDb) => {
  const found = runs(cn0DbHz, 4);
  test("reads what was put in", () => {
    const errors = found.map(({ estimate }) => estimate.cn0DbHz - cn0DbHz);
    expectNear(mean(errors), 0, 4 * (scatterDb / Math.sqrt(RUNS)), "mean error");
    expectNear(standardDeviation(errors), scatterDb, 0.4 * scatterDb, "scatter");
  });
  test("finds bit edge and residual", () => {
    expect(found.filter(({ edge, estimate }) => edge !== estimate.edge).length).toBeLessThanOrEqual(1);
    for (const { estimate } of found) expectNear(estimate.residualHz, 4, 0.6, "residual, Hz");
  });
});

describe("mistakes on a strong channel", () => {
  const found = runs(46, -4);
  const errorsOf = (of: typeof cutThroughBits) =>
    found.map(({ prompts, estimate, edge }) => ({ edge, error: of(prompts, estimate) - 46 }));

  // The mean of the logarithm of an exponential law is 0.5772/ln 10 * 10 = 2.507 dB under that of its mean (Euler's
  // constant); subtracting the bit's own mean takes 1/20 of the noise away, another 0.22 dB.
  test("noise averaged in dB reads 2.7 dB high", () =>
    expectNear(mean(errorsOf(noiseAveragedInDb).map(({ error }) => error)), 2.507 + 0.223, 0.08, "error"));

  // mu = (M s L + 1)/(s + 1) with s = 39.81 in 1 ms, M = 20 and L = (sin x / x)^2 = 0.97908 at x = pi * 4 Hz * 20 ms:
  // 19.126, and (mu - 1)/(T (M - mu)) = 43.17 dB-Hz.
  test("a residual of 4 Hz left in reads 2.8 dB low", () =>
    expectNear(mean(errorsOf(residualLeftIn).map(({ error }) => error)), 43.17 - 46, 0.15, "error"));

  test("bits cut read low, by the more the nearer the cut is to their middle", () => {
    const errors = errorsOf(cutThroughBits);
    const middle = errors.filter(({ edge }) => edge >= 8 && edge <= 12).map(({ error }) => error);
    const near = errors.filter(({ edge }) => edge === 1 || edge === 19).map(({ error }) => error);
    expect(middle.length).toBeGreaterThan(3);
    expect(Math.max(...middle)).toBeLessThan(-8);
    expect(Math.min(...near)).toBeGreaterThan(-9);
  });
});

test("noise alone, too few prompts and silence have no estimate", () => {
  expect(estimateCn0([])).toBeNull();
  expect(estimateCn0(new Float64Array(160))).toBeNull();
  expect(estimateCn0(new Float64Array(4000))).toBeNull();
});
