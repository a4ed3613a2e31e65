import { expect, test } from "vitest";
import { pointBiserial } from "@/lib/numeric/pointBiserial";
import { seededRandom } from "@/lib/numeric/random";
import { fitLine } from "@/lib/numeric/statistics";
import { expectNear } from "@/tests/support/expectNear";

// Worked by hand: means 0.8 and 0.3, variance 0.08, p q = 0.24, so that r squared is 0.25 * 0.24 / 0.08 = 3/4.
test("a table of five", () => {
  const yes = [true, true, true, false, false];
  expectNear(pointBiserial(yes, [1, 0.8, 0.6, 0.4, 0.2])!, Math.sqrt(0.75), 1e-15, "rising");
  expectNear(pointBiserial(yes, [0, 0.2, 0.4, 0.6, 0.8])!, -Math.sqrt(0.75), 1e-15, "falling");
});

// A second way: the two lines of regression have slopes whose product is the square of the correlation.
test("its square is the product of both slopes", () => {
  const random = seededRandom("b1".repeat(32), "point-biserial");
  for (let n = 0; n < 20; n++) {
    const values = Array.from({ length: 40 }, () => random.integer(0, 6) / 6);
    const yes = values.map((value) => random.uniform() < 0.2 + 0.6 * value);
    const asNumbers = yes.map(Number);
    const found = pointBiserial(yes, values)!;
    const slope = fitLine(values, asNumbers).slope;
    expectNear(found * found, slope * fitLine(asNumbers, values).slope, 1e-12, "square");
    expect(Math.sign(found)).toBe(Math.sign(slope));
  }
});

test("a yes or no against itself is 1", () => {
  expect(pointBiserial([true, false, false], [1, 0, 0])).toBe(1);
});

test.each([
  ["all yes", [true, true], [0.2, 0.4]],
  ["all no", [false, false], [0.2, 0.4]],
  ["equal thirds", [true, false, true, true, false, true], Array(6).fill(1 / 3)],
  ["nothing", [], []],
])("%s: no correlation can be told", (_what, yes, values) => expect(pointBiserial(yes, values)).toBeNull());

test("refuses unequal lengths", () => expect(() => pointBiserial([true], [])).toThrow(/^pointBiserial/));
