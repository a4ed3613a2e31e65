import { describe, expect, test } from "vitest";
import { CELLS, rayleighThreshold, readTrace } from "@/lib/checks/correlator-reading/readTrace";
import { expectNear } from "@/tests/support/expectNear";

/** A flat trace of 1 with single cells raised. */
const traceWith = (...cells: [number, number][]) => {
  const trace = Array.from({ length: CELLS }, () => 1);
  for (const [cell, value] of cells) trace[cell] = value;
  return trace;
};

describe("threshold of one cell in sigma", () => {
  // Kaplan & Hegarty, Understanding GPS, 2nd ed., 5.8: V_t = sigma sqrt(-2 ln Pfa), worked to eight figures. The mean of
  // the envelope is sigma sqrt(pi/2), 1.2533141 (Rayleigh law, textbook).
  test.each([
    [0.16, 1.9144615],
    [0.05, 2.4477468],
    [0.001, 3.7169222],
  ])("Pfa %d", (falseAlarm, sigmas) => expectNear(rayleighThreshold(1.2533141, falseAlarm), sigmas, 1e-6, "threshold"));
});

describe("second peak and noise", () => {
  test("come from cells more than one chip from the highest", () => {
    const reading = readTrace(traceWith([1000, 20], [1008, 15], [992, 14], [1009, 7], [5000, 5]), 1e-6);
    expect(reading).toMatchObject({ highestLagChips: 125, highest: 20, secondLagChips: 126.125, second: 7 });
    // 8184 cells less 17 round the highest; two of them raised.
    expectNear(reading.noiseMean, (8167 - 2 + 7 + 5) / 8167, 1e-12, "noise mean");
  });

  test("go round the end of the code", () => {
    const reading = readTrace(traceWith([0, 20], [CELLS - 8, 15], [CELLS - 9, 7]), 1e-6);
    expect(reading).toMatchObject({ highestLagChips: 0, second: 7, secondLagChips: (CELLS - 9) / 8 });
  });

  test("median and root mean square are told apart from the mean", () => {
    const half: number[] = Array.from({ length: CELLS }, (_, cell) => (cell % 4 === 0 ? 5 : 1));
    const reading = readTrace(half.with(4001, 50), 1e-6);
    expect(reading.noiseMedian).toBe(1);
    expectNear(reading.noiseMean, 2, 0.01, "mean");
    expectNear(reading.noiseRms, Math.sqrt(7), 0.01, "rms");
  });
});

test("detects above the threshold, not at it", () => {
  const flat = traceWith([100, 4]);
  const { threshold } = readTrace(flat, 1e-6);
  expect(readTrace(traceWith([100, threshold * 1.01]), 1e-6).detected).toBe(true);
  expect(readTrace(traceWith([100, threshold * 0.99]), 1e-6).detected).toBe(false);
});
