import { describe, expect, test } from "vitest";
import { thresholdSigma2 } from "@/lib/gnss/detection";
import { planPerformance, type SearchPlan } from "@/lib/gnss/searchPlan";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

const random = () => seededRandom("be".repeat(32), "plan");
const plan = (change: Partial<SearchPlan> = {}): SearchPlan =>
  ({
    cn0DbHz: 34,
    coherentMs: 1,
    sums: 20,
    dopplerBinHz: 500,
    codeStepChips: 0.5,
    windowHz: 5000,
    falseAlarmPerSearch: 1e-3,
    correlators: 1000,
    bitEdgesKnown: false,
    draws: 5000,
    random: random(),
    ...change,
  }) as SearchPlan;

// Simulated by a second program: 1e-3 false alarms per search, +-5 kHz, half-chip steps, bins of 1/(2T) but for one.
// Printed to two or three digits, so half the last one is allowed, and three standard errors of our own draws.
test.each([
  [34, 1, 20, 500, 0.51, 0.005],
  [34, 1, 60, 500, 0.995, 0.0005],
  [34, 4, 10, 125, 0.996, 0.0005],
  [31, 4, 10, 125, 0.64, 0.005],
  [31, 4, 20, 125, 0.978, 0.0005],
  [31, 10, 10, 50, 0.997, 0.0005],
  [31, 10, 10, 100, 0.971, 0.0005],
  [31, 20, 5, 25, 0.93, 0.005],
])(
  "%i dB-Hz, %i ms x %i, bins of %i Hz: detection %d",
  (cn0DbHz, coherentMs, sums, dopplerBinHz, printed, rounding) => {
    const { detection, detectionStandardError } = planPerformance(plan({ cn0DbHz, coherentMs, sums, dopplerBinHz }));
    expect(detectionStandardError).toBeLessThan(0.007);
    // The reference has draws of its own, as many as ours.
    expectNear(detection, printed, rounding + 3 * Math.SQRT2 * detectionStandardError, "detection");
  },
);

describe("cells, false alarms and time", () => {
  // D13: 1023 chips in half steps, +-5 kHz in 500 Hz bins: 42,966 cells, 42.966 s one by one at 1 ms.
  test("as counted in the handbook rule", () => {
    const result = planPerformance(plan({ sums: 1, correlators: 1, draws: 2 }));
    expect(result.cells).toBe(42_966);
    expectNear(result.searchTimeS, 42.966, 1e-9, "time");
    // D05 with 42,966 cells: 0.01 per search is 2.33914e-7 per cell, a threshold of 30.5366 for one sum.
    const hundredth = planPerformance(plan({ sums: 1, falseAlarmPerSearch: 0.01, draws: 2 }));
    expectNearRelative(hundredth.falseAlarmPerCell, 2.33914e-7, 2e-5, "per cell");
    expectNearRelative(hundredth.thresholdSigma2, 30.5366, 2e-5, "threshold");
  });

  test("a window that is no whole number of bins is covered to its edge", () => {
    expectNear(planPerformance(plan({ windowHz: 5001, draws: 2 })).cells, 23 * 2046, 1e-9, "cells");
    expectNear(planPerformance(plan({ windowHz: 0, draws: 2 })).cells, 2046, 1e-9, "cells without a window");
  });

  test("a given threshold and the false alarms it was made for say the same", () => {
    const asked = planPerformance(plan());
    const given = planPerformance({
      ...plan(),
      falseAlarmPerSearch: undefined,
      thresholdSigma2: asked.thresholdSigma2,
    });
    expectNearRelative(given.falseAlarmPerSearch, 1e-3, 1e-9, "false alarms per search");
    expect(given.detection).toBe(asked.detection);
    expectNearRelative(asked.thresholdSigma2, thresholdSigma2(asked.falseAlarmPerCell, 20), 1e-9, "threshold");
  });

  test("taking false alarms per cell for those per search floods the search", () => {
    const wrong = planPerformance({
      ...plan(),
      falseAlarmPerSearch: undefined,
      thresholdSigma2: thresholdSigma2(1e-3, 20),
    });
    expectNear(wrong.falseAlarmPerSearch, 1, 1e-12, "false alarms per search");
  });
});

describe("detection", () => {
  test("rises with power and with time, and falls with a wider bin", () => {
    const of = (change: Partial<SearchPlan>) => planPerformance(plan(change)).detection;
    expect(of({ cn0DbHz: 36 })).toBeGreaterThan(of({ cn0DbHz: 34 }));
    expect(of({ sums: 40 })).toBeGreaterThan(of({ sums: 20 }));
    expect(of({ dopplerBinHz: 1000 })).toBeLessThan(of({ dopplerBinHz: 500 }));
    expect(of({ codeStepChips: 1 })).toBeLessThan(of({ codeStepChips: 0.5 }));
  });

  test("without a signal is the false alarm of one cell", () => {
    const { detection, falseAlarmPerCell } = planPerformance(plan({ cn0DbHz: -100, draws: 10 }));
    expectNearRelative(detection, falseAlarmPerCell, 1e-6, "detection");
  });

  test("a strong signal is always seen", () => {
    const { detection, detectionStandardError } = planPerformance(plan({ cn0DbHz: 55, draws: 200 }));
    expectNear(detection, 1, 1e-10, "detection");
    expectNear(detectionStandardError, 0, 1e-9, "standard error");
  });

  // Mean of (1 - 2a)^2 over a flip anywhere is 1/3; with 20 ms sums half of them hold one: 1 - (1/2)(2/3) of the power.
  test("unknown bit edges cost a 20 ms sum a third of its power on average", () => {
    const fine = { coherentMs: 20, sums: 100, dopplerBinHz: 1e-6, codeStepChips: 1e-6, windowHz: 0 };
    const lost = planPerformance(plan({ ...fine, cn0DbHz: 15, draws: 400 })).detection;
    const known = planPerformance(
      plan({ ...fine, coherentMs: 0.02, sums: 100, cn0DbHz: 15 + 10 * Math.log10(1000 * (2 / 3)), draws: 2 }),
    ).detection;
    expectNear(lost, known, 0.05, "detection at the mean power");
  });
});

test("repeats itself for the same draws", () => expect(planPerformance(plan())).toEqual(planPerformance(plan())));

test.each<[string, Partial<SearchPlan>]>([
  ["a coherent time beyond a data bit", { coherentMs: 21 }],
  ["no coherent time", { coherentMs: 0 }],
  ["half a sum", { sums: 1.5 }],
  ["no bin", { dopplerBinHz: 0 }],
  ["steps beyond the triangle", { codeStepChips: 2.1 }],
  ["no correlator", { correlators: 0 }],
  ["one draw", { draws: 1 }],
  ["a certain false alarm", { falseAlarmPerSearch: 1 }],
])("refuses %s", (_what, change) => expect(() => planPerformance(plan(change))).toThrow(RangeError));
