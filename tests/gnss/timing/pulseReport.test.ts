import { expect, test } from "vitest";
import { pulseReport } from "@/lib/gnss/timing/pulseReport";
import { expectNear } from "@/tests/support/expectNear";

// Two hours at 1 s: mean 30 ns, a wave of 5 ns over an hour, one missed trigger, a step of 12 ns at reading 4000.
const values = Float64Array.from(
  { length: 7200 },
  (_, n) => 30 + 5 * Math.sin((2 * Math.PI * n) / 3600) + (n >= 4000 ? 12 : 0),
);
values[1234] = 400;
const log = { intervalS: 1, valuesNs: values };

// ITU-T G.8272: 100 ns for the A class and 40 ns for the B class, the mean not taken off.
test("a missed trigger decides until it is left out", () => {
  const kept = pulseReport(log, "PRTC-A", false).report;
  expect(kept.outliers).toEqual([1234]);
  expect(kept.summary.maxAbsNs).toBe(400);
  expect(kept.withinMax).toBe(false);
  const { report, series } = pulseReport(log, "PRTC-A", true);
  expectNear(report.summary.maxAbsNs, 42 + 5, 0.01, "max|TE|");
  expect(report.withinMax && report.withinMtie).toBe(true);
  expect(Number.isNaN(series.valuesNs[1234])).toBe(true);
  expect(pulseReport(log, "PRTC-B", true).report.withinMax).toBe(false);
});

test("the step is found where it is, and the largest interval sees the whole swing", () => {
  const { report } = pulseReport(log, "PRTC-A", true);
  expect(Math.abs(report.step!.index - 4000)).toBeLessThanOrEqual(1);
  expectNear(report.step!.sizeNs, 12, 0.6, "size");
  // G.810, 4.5.13: peak to peak of any window; over 5000 s a window holds the lowest and the highest reading.
  expectNear(report.mtie.at(-1)!.ns, report.summary.peakToPeakNs, 1e-9, "MTIE");
  expect(report.mtie.map(({ tauS }) => tauS).slice(0, 4)).toEqual([1, 2, 5, 10]);
  // ITU-T G.8272, Fig. 1 and 2: 0.275 tau + 25 ns, and 3 ns up to 100 s.
  expectNear(report.mtie.find(({ tauS }) => tauS === 100)!.limitNs, 52.5, 1e-9, "mask of MTIE");
  expectNear(report.tdev.find(({ tauS }) => tauS === 100)!.limitNs, 3, 1e-9, "mask of TDEV");
});

test("intervals below the mask, and logs too short for a curve, are left out", () => {
  const fast = pulseReport({ intervalS: 0.05, valuesNs: values }, "PRTC-A", true).report;
  expect(fast.mtie[0].tauS).toBe(0.25);
  const short = pulseReport({ intervalS: 1, valuesNs: Float64Array.of(1, 2, 3) }, "PRTC-A", false).report;
  expect(short.summary.maxAbsNs).toBe(3);
  expect(short.outliers).toEqual([]);
});
