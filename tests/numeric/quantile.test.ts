import { expect, test } from "vitest";
import { quantile } from "@/lib/numeric/quantile";
import { median } from "@/lib/numeric/statistics";
import { expectNear } from "@/tests/support/expectNear";

// NIST/SEMATECH e-Handbook of Statistical Methods, 7.2.6.2: twelve measurements from a gauge study, their 90th percentile.
const GAUGED = [
  ...[95.1772, 95.1567, 95.1937, 95.1959, 95.1442, 95.061],
  ...[95.1591, 95.1195, 95.1065, 95.0925, 95.199, 95.1682],
];
test("the printed percentile", () => expectNear(quantile(GAUGED, 0.9), 95.1981, 5e-5, "90th percentile"));

// Worked by hand: place 0.25 * 12 = 3 and 0.75 * 12 = 9 of eleven, 1.25 and 3.75 of four.
test.each([
  [[11, 1, 10, 2, 9, 3, 8, 4, 7, 5, 6], 3, 9],
  [[4, 8, 2, 6], 2.5, 7.5],
])("quartiles of %j", (values, lower, upper) => {
  expect([quantile(values, 0.25), quantile(values, 0.75)]).toEqual([lower, upper]);
});

test("never beyond the values, and a half is the median", () => {
  for (const values of [[7], [7, 9], [3, 1, 2], GAUGED]) {
    expect(quantile(values, 0.01)).toBe(Math.min(...values));
    expect(quantile(values, 0.99)).toBe(Math.max(...values));
    expectNear(quantile(values, 0.5), median(values), 1e-12, "median");
  }
});

test.each([
  [[], 0.5],
  [[1], 0],
  [[1], 1],
  [[1], NaN],
])("refuses %j at %f", (values, share) => {
  expect(() => quantile(values, share)).toThrow(/^quantile/);
});
