import { expect, test } from "vitest";
import { integrate } from "@/lib/numeric/quadrature";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

// Closed forms of analysis, Abramowitz & Stegun 3.3 and 7.1.
test.each([
  ["x^19", (x: number) => x ** 19, 0, 2, 2 ** 20 / 20, 1],
  ["1/x", (x: number) => 1 / x, 1, 10, Math.LN10, 8],
  ["sin", Math.sin, 0, Math.PI, 2, 1],
  ["exp(-x^2)", (x: number) => Math.exp(-x * x), 0, 6, Math.sqrt(Math.PI) / 2, 8],
  ["exp backwards", Math.exp, 1, 0, 1 - Math.E, 1],
] as const)("integral of %s", (_name, of, from, to, expected, panels) =>
  expectNearRelative(integrate(of, from, to, panels), expected, 1e-12, "integral"),
);

test("a panel per half period suffices for a wave", () => {
  const wave = (x: number) => Math.sin(40 * x) ** 2;
  expectNear(integrate(wave, 0, Math.PI, 80), Math.PI / 2, 1e-12, "integral");
});

test.each([0, 1.5, NaN])("refuses %s panels", (panels) =>
  expect(() => integrate(Math.sin, 0, 1, panels)).toThrow(RangeError),
);
