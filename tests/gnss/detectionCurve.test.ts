import { expect, test } from "vitest";
import { detectionProbability, thresholdSigma2 } from "@/lib/gnss/detection";
import { createDetectionCurve } from "@/lib/gnss/detectionCurve";
import { planDetection, planPerformance, type SearchPlan } from "@/lib/gnss/searchPlan";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

// Published points of the generalised Marcum Q: check values D02 and D04, Kaplan & Hegarty (5.53).
test.each([
  [40, 0.001, 1, 1e-3, 0.810292],
  [36, 0.001, 10, 1e-3, 0.999684],
  [33, 0.001, 20, 1e-3, 0.995267],
  [37, 0.001, 5, 1e-6, 0.811184],
])("%d dB-Hz, %d s x %d, false alarms %d: %d", (cn0DbHz, coherentS, sums, falseAlarm, expected) => {
  const curve = createDetectionCurve(thresholdSigma2(falseAlarm, sums), sums);
  expectNear(curve(10 ** (cn0DbHz / 10) * coherentS), expected, 1e-6, "detection");
});

test.each([
  [1, 1e-9],
  [1, 0.1],
  [20, 1e-8],
  [100, 1e-3],
  [500, 1e-7],
])("%d sums, false alarms of %d per cell: the curve keeps to the law all the way up", (sums, falseAlarm) => {
  const threshold = thresholdSigma2(falseAlarm, sums);
  const curve = createDetectionCurve(threshold, sums);
  for (let n = 0; n <= 300; n++) {
    const rho = (n * 3 * threshold) / 300 / (2 * sums);
    expectNear(curve(rho), detectionProbability(threshold, sums, rho), 1e-7, `detection at ${rho}`);
  }
  expect(curve(1e6)).toBe(1);
});

test("the quick detection of a plan is that of its whole performance", () => {
  const plan = (cn0DbHz: number, coherentMs: number, sums: number): SearchPlan => ({
    ...{ cn0DbHz, coherentMs, sums, dopplerBinHz: 500 / coherentMs, codeStepChips: 0.5, windowHz: 5000 },
    ...{ correlators: 1, bitEdgesKnown: false, draws: 500, falseAlarmPerSearch: 1e-3 },
    random: seededRandom("3d".repeat(32), "plan"),
  });
  for (const [cn0DbHz, coherentMs, sums] of [
    [34, 1, 20],
    [31, 4, 20],
    [28, 10, 10],
    [45, 1, 1],
  ]) {
    const whole = planPerformance(plan(cn0DbHz, coherentMs, sums)).detection;
    expectNear(planDetection(plan(cn0DbHz, coherentMs, sums)), whole, 1e-6, `${cn0DbHz} dB-Hz`);
  }
});
