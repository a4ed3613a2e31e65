import { describe, expect, test } from "vitest";
import { binomialBounds } from "@/lib/numeric/binomialBounds";
import { expectNear } from "@/tests/support/expectNear";

const both = (met: number, tried: number, lower: number, upper: number, within: number) => {
  const bounds = binomialBounds(met, tried, 0.95);
  expectNear(bounds.lower, lower, within, "lower bound");
  expectNear(bounds.upper, upper, within, "upper bound");
};

// Clopper & Pearson, Biometrika 26 (1934): the bounds as quantiles of the beta distribution, from another program.
test.each([
  [0, 10, 0, 0.3084971078187607],
  [1, 10, 0.0025285785444617848, 0.4450161170281954],
  [5, 10, 0.18708602844739855, 0.8129139715526015],
  [1, 2, 0.01257911709342505, 0.9874208829065749],
  [970, 1000, 0.9574485975299709, 0.9796695143168904],
  [965, 1000, 0.9516576183857783, 0.9755024721052413],
  [50, 1000, 0.03733539760466178, 0.06539048791549364],
  [100, 10_000, 0.008143596567611065, 0.012149504886061608],
  [3, 10_000, 6.187148574838713e-5, 0.0008764745225140007],
])("%i of %i", (met, tried, lower, upper) => both(met, tried, lower, upper, 1e-10));

// None seen, all seen: the chance of it is (1 - p)^n and p^n, so the bound is a root.
test.each([1, 10, 1000])("none and all of %i", (tried) => {
  const root = Math.pow(0.025, 1 / tried);
  both(0, tried, 0, 1 - root, 1e-11);
  both(tried, tried, root, 1, 1e-11);
});

describe("laws", () => {
  test("a bound and its opposite are each other's mirror", () => {
    for (let met = 0; met <= 30; met++) {
      const seen = binomialBounds(met, 30, 0.9);
      const missed = binomialBounds(30 - met, 30, 0.9);
      expectNear(seen.lower, 1 - missed.upper, 1e-12, "lower bound");
      expect(seen.lower <= met / 30 && met / 30 <= seen.upper).toBe(true);
    }
  });

  test("more confidence, wider bounds; more cases, narrower ones", () => {
    const width = (met: number, tried: number, confidence: number) => {
      const { lower, upper } = binomialBounds(met, tried, confidence);
      return upper - lower;
    };
    expect(width(97, 100, 0.99)).toBeGreaterThan(width(97, 100, 0.95));
    expect(width(970, 1000, 0.95)).toBeLessThan(width(97, 100, 0.95));
  });
});

test.each([
  [1, 0, 0.95],
  [-1, 10, 0.95],
  [11, 10, 0.95],
  [1.5, 10, 0.95],
  [NaN, 10, 0.95],
  [1, 10, 1],
  [1, 10, NaN],
])("refuses %d of %d at %d", (met, tried, confidence) =>
  expect(() => binomialBounds(met, tried, confidence)).toThrow(RangeError),
);
