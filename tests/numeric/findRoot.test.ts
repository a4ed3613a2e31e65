import { expect, test } from "vitest";
import { findRoot } from "@/lib/numeric/findRoot";
import { expectNear } from "@/tests/support/expectNear";

// Roots known in closed form.
test.each([
  ["x^2 - 2", (x: number) => x * x - 2, 0, 2, Math.SQRT2],
  ["cos", Math.cos, 3, 0, Math.PI / 2],
  ["a straight line", (x: number) => 3 * x - 1, -10, 10, 1 / 3],
  ["a steep bend", (x: number) => Math.exp(50 * x) - 1e10, 0, 2, Math.log(1e10) / 50],
  ["a step", (x: number) => (x < 0.7 ? -1 : 1), 0, 1, 0.7],
] as const)("root of %s", (_name, of, low, high, expected) =>
  expectNear(findRoot(of, low, high, 1e-12), expected, 2e-12, "root"),
);

test("an end that is the root is the answer", () => {
  expect(findRoot((x) => x, 0, 5, 1e-9)).toBe(0);
  expect(findRoot((x) => x - 5, 0, 5, 1e-9)).toBe(5);
});

test("a bracket without a change of sign is refused", () =>
  expect(() => findRoot((x) => x * x + 1, -1, 1, 1e-9)).toThrow(RangeError));

test("takes few calls", () => {
  let calls = 0;
  findRoot((x) => (calls++, x ** 3 - 2), 0, 2, 1e-12);
  expect(calls).toBeLessThan(90);
});
