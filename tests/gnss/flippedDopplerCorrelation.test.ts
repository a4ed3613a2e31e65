import { expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { exactCorrelation } from "@/lib/gnss/exactCorrelation";
import { flippedDopplerCorrelation } from "@/lib/gnss/flippedDopplerCorrelation";
import type { Chips } from "@/lib/gnss/shiftRegister";
import { expectNear } from "@/tests/support/expectNear";

/** The sum as it is defined, term by term. */
function defined(a: Chips, b: Chips, turnsPerChip: number, k: number): number {
  let [re, im] = [0, 0];
  for (let n = 0; n < a.length; n++) {
    const chip = a[n] * b[(n + k) % b.length] * (n + k < b.length ? 1 : -1);
    re += chip * Math.cos(2 * Math.PI * turnsPerChip * n);
    im += chip * Math.sin(2 * Math.PI * turnsPerChip * n);
  }
  return Math.hypot(re, im);
}

test.each([
  [3, 30, 500],
  [7, 7, -1250],
  [19, 4, 9_876.5],
])("C/A %i with %i at %d Hz is the direct sum", (one, other, dopplerHz) => {
  const [a, b] = [caCode(one), caCode(other)];
  const values = flippedDopplerCorrelation(a, b, dopplerHz);
  for (const k of [0, 1, 2, 100, 511, 1021, 1022])
    expectNear(values[k], defined(a, b, dopplerHz / 1.023e6, k), 1e-8, `lag ${k}, chips`);
});

test("without a Doppler difference it is the exact one", () => {
  const [a, b] = [caCode(12), caCode(25)];
  const { flipped } = exactCorrelation(a, b);
  flippedDopplerCorrelation(a, b, 0).forEach((value, k) =>
    expectNear(value, Math.abs(flipped[k]), 1e-9, `lag ${k}, chips`),
  );
});

// By hand, for N ones: half a turn over the period leaves 2N/pi of N. With a flip in the middle two halves of N sqrt(2)/pi each
// stand a right angle apart and are subtracted: 2N/pi again, where without Doppler nothing would be left.
test("half a turn and a flip in the middle leave 2N/pi", () => {
  const ones = new Int8Array(1000).fill(1);
  const values = flippedDopplerCorrelation(ones, ones, 500, 1e6);
  expectNear(values[0], 2000 / Math.PI, 0.01, "no flip");
  expectNear(values[500], 2000 / Math.PI, 0.01, "flip in the middle");
  expectNear(flippedDopplerCorrelation(ones, ones, 0, 1e6)[500], 0, 1e-9, "flip in the middle, no Doppler");
});

test("codes of unequal length are refused", () => {
  expect(() => flippedDopplerCorrelation(Int8Array.of(1, 1), Int8Array.of(1, 1, 1), 0)).toThrow(RangeError);
});
