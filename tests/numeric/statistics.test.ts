import { expect, test } from "vitest";
import { findMaximum } from "@/lib/numeric/findMaximum";
import { seededRandom } from "@/lib/numeric/random";
import { fitLine, mean, median, robustDeviation, robustSpread, standardDeviation } from "@/lib/numeric/statistics";
import { expectNear } from "@/tests/support/expectNear";

// NIST/SEMATECH e-Handbook, Statistical Reference Datasets, "NumAcc1" and "NumAcc2": certified mean and deviation.
test("certified means and deviations", () => {
  expect(mean([10_000_001, 10_000_003, 10_000_002])).toBe(10_000_002);
  expect(standardDeviation([10_000_001, 10_000_003, 10_000_002])).toBe(1);
  const second = [1.2, ...Array.from({ length: 1000 }, (_, n) => (n % 2 === 0 ? 1.1 : 1.3))];
  expectNear(mean(second), 1.2, 1e-14, "mean");
  expectNear(standardDeviation(second), 0.1, 1e-14, "deviation");
});

// Of a normal law, the robust deviation is the standard deviation: Hampel 1974.
test("the robust deviation of normal draws is 1, outliers or not", () => {
  const random = seededRandom("2".repeat(64), "statistics");
  const draws = Array.from({ length: 20_000 }, () => random.gaussian());
  expectNear(robustDeviation(draws), 1, 0.02, "draws");
  draws.fill(1e6, 0, 100);
  expectNear(robustDeviation(draws), 1, 0.03, "one in 200 is far off");
});

// The definition itself, by two medians: Hampel 1974.
test("median and robust deviation at once are the two worked one after the other", () => {
  const random = seededRandom("5e".repeat(32), "spread");
  for (let count = 1; count <= 40; count++) {
    // Whole numbers, so that some are equal.
    const values = Float64Array.from(
      { length: count },
      () => random.integer(-9, 9) * (random.uniform() < 0.1 ? 100 : 1),
    );
    const middle = median(values);
    const deviation = 1.4826022185056018 * median(values.map((value) => Math.abs(value - middle)));
    expect(robustSpread(values)).toEqual({ middle, deviation });
  }
  expect(() => robustSpread([])).toThrow(/^robustSpread/);
});

test("medians and lines by hand", () => {
  expect(median([9, 1, 5])).toBe(5);
  expect(median([4, 1, 9, 2])).toBe(3);
  expect(fitLine([0, 1, 2], [1, 3, 5])).toEqual({ slope: 2, intercept: 1 });
});

test("too little is refused", () => {
  for (const wrong of [() => mean([]), () => median([]), () => standardDeviation([1]), () => fitLine([1, 1], [2, 3])])
    expect(wrong).toThrow(RangeError);
});

test("a single peak is found as finely as rounding allows", () => {
  expectNear(
    findMaximum((x) => -(x - 0.3) * (x - 0.3), -1, 2, 1e-9),
    0.3,
    2e-8,
    "parabola",
  );
  expectNear(
    findMaximum((x) => x, 0, 1, 1e-9),
    1,
    1e-8,
    "at the end",
  );
});
