import { expect, test } from "vitest";
import { bestQuantiserStep, quantiserEfficiency, quantiserLossDb } from "@/lib/gnss/chain/quantiserLoss";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

// Hegarty 2011: 1.96 and 0.55 dB for 1 and 2 bit (text seen); 3 bit from memory.
test.each(formulaCases("S08"))("$name", ({ given, expected }) => {
  const step = bestQuantiserStep(given.levels);
  expectNearRelative(quantiserEfficiency(given.levels, step), expected.eta, 2e-5, "share left");
  expectNearRelative(quantiserLossDb(given.levels, step), expected.loss_dB, 2e-5, "loss");
  // The step is printed to four figures.
  if (given.best_step_sigma !== null) expectNear(step, given.best_step_sigma, 1e-4, "step");
});

// S09: values of a second program by the same formula.
test.each(formulaCases("S09"))("$name", ({ given, expected }) =>
  expectNearRelative(quantiserLossDb(given.levels, given.step), expected.loss_dB, 2e-5, "loss"),
);

test("two levels do not mind the step, many lose next to nothing", () => {
  expectNear(quantiserLossDb(2, 0.1), quantiserLossDb(2, 3), 1e-12, "two levels");
  expect(quantiserLossDb(256, bestQuantiserStep(256))).toBeLessThan(0.001);
});

test.each([
  [1, 1],
  [2.5, 1],
  [4, 0],
])("refuses %s levels of %s sigma", (levels, step) =>
  expect(() => quantiserEfficiency(levels, step)).toThrow(RangeError),
);
