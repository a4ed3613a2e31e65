import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { chiSquareInverseSurvival, chiSquareSurvival, noncentralChiSquareSurvival } from "@/lib/numeric/chiSquare";
import { erfc, erfcInverse } from "@/lib/numeric/erfc";
import { logGamma, upperGammaRatio } from "@/lib/numeric/gammaFunction";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative as near } from "@/tests/support/expectNear";

const SIX_DIGITS = 2e-5;

describe("printed tables", () => {
  // Abramowitz & Stegun, Table 26.8, percentage points of the chi-square distribution.
  test.each([
    [0.05, 1, 3.84146],
    [0.001, 2, 13.8155],
    [0.001, 10, 29.5883],
    [0.005, 20, 39.9968],
    [0.05, 30, 43.773],
    [0.05, 100, 124.342],
  ])("chi-square is exceeded with probability %d at %i degrees from %d", (p, degrees, x) => {
    near(chiSquareInverseSurvival(p, degrees), x, 5e-6, "point");
    near(chiSquareSurvival(x, degrees), p, 1e-4, "probability at the rounded point");
  });

  // Abramowitz & Stegun, Table 7.1, error function.
  test.each([
    [0.5, 0.5204998778],
    [1, 0.8427007929],
    [2, 0.995322265],
  ])("erf(%d)", (x, printed) => {
    expectNear(1 - erfc(x), printed, 5e-11, "erf");
    expectNear(erfc(-x) - 1, printed, 5e-11, "erf from the other side");
  });

  // Gamma(1/2) = sqrt pi (Abramowitz & Stegun 6.1.8), Gamma(n + 1) = n! (6.1.5), Table 6.1: Gamma(1.5).
  test.each([
    [0.5, Math.log(Math.sqrt(Math.PI))],
    [1.5, Math.log(0.8862269255)],
    [11, Math.log(3_628_800)],
    [21, Math.log(2_432_902_008_176_640_000)],
  ])("logGamma(%d)", (x, value) => expectNear(logGamma(x), value, 6e-11, "ln Gamma"));
});

// Worked numbers of a second program, six digits.
test.each(formulaCases("D03"))("$name", ({ given, expected }) =>
  near(chiSquareInverseSurvival(given.Pfa, 2 * given.M), expected.gamma, SIX_DIGITS, "gamma"),
);

test.each(formulaCases("D04"))("$name", ({ given, expected }) => {
  const rho = 10 ** (given.CN0_dBHz / 10) * given.T_s;
  const gamma = chiSquareInverseSurvival(given.Pfa, 2 * given.M);
  near(gamma, expected.gamma, SIX_DIGITS, "gamma");
  near(noncentralChiSquareSurvival(gamma, 2 * given.M, 2 * given.M * rho), expected.Pd, SIX_DIGITS, "Pd");
});

describe("laws", () => {
  test("even degrees have a closed form, exp(-x/2) sum (x/2)^k/k!, up to a thousand", () => {
    for (const [x, degrees] of [
      [1, 2],
      [30, 20],
      [120, 40],
      [900, 1000],
      [1100, 1000],
      [60, 2],
    ]) {
      let term = 1;
      let sum = 1;
      for (let k = 1; k < degrees / 2; k++) sum += term *= x / 2 / k;
      near(chiSquareSurvival(x, degrees), Math.exp(-x / 2) * sum, 1e-11, `x ${x}, ${degrees} degrees`);
    }
  });

  test("the inverse undoes the survival function, far into the tail", () => {
    const anyCase = fc.tuple(fc.double({ min: -28, max: -0.001, noNaN: true }), fc.integer({ min: 1, max: 1000 }));
    fc.assert(
      fc.property(anyCase, ([exponent, degrees]) => {
        const p = 10 ** exponent;
        near(chiSquareSurvival(chiSquareInverseSurvival(p, degrees), degrees), p, 1e-9, "probability");
      }),
      { seed: 1, numRuns: 60 },
    );
    expect(chiSquareInverseSurvival(1e-300, 2)).toBeGreaterThan(1381);
    for (const p of [0, 1, -0.1, NaN]) expect(() => chiSquareInverseSurvival(p, 2)).toThrow(RangeError);
  });

  test("erfcInverse undoes erfc on both sides", () => {
    for (const x of [-3, -1, -0.1, 0, 0.2, 1.5, 5]) expectNear(erfcInverse(erfc(x)), x, 2e-11, `x ${x}`);
  });

  test("noncentral: without an offset it is central; degrees and offsets add up", () => {
    near(noncentralChiSquareSurvival(30, 20, 0), chiSquareSurvival(30, 20), 1e-15, "lambda 0");
    // 5e-324 halved is 0, whose logarithm once made the sum endless
    for (const lambda of [1e-12, 5e-324])
      near(noncentralChiSquareSurvival(30, 20, lambda), chiSquareSurvival(30, 20), 1e-11, `lambda ${lambda}`);
    expect(noncentralChiSquareSurvival(0, 20, 5)).toBe(1);
    // One degree: the square of a normal variable with mean sqrt(lambda).
    for (const [x, lambda] of [
      [4, 1],
      [30, 9],
      [100, 30],
      [2, 40],
    ]) {
      const [root, mean] = [Math.sqrt(x), Math.sqrt(lambda)];
      const both = (erfc((root - mean) / Math.SQRT2) + erfc((root + mean) / Math.SQRT2)) / 2;
      near(noncentralChiSquareSurvival(x, 1, lambda), both, 1e-11, `one degree, x ${x}, lambda ${lambda}`);
    }
  });

  test("noncentral: 1000 degrees and large offsets follow the normal limit", () => {
    // Mean k + lambda, variance 2(k + 2 lambda); the skew left at this size moves the middle by less than 0.005.
    for (const lambda of [1000, 50_000]) {
      const [mean, deviation] = [1000 + lambda, Math.sqrt(2 * (1000 + 2 * lambda))];
      for (const z of [-2, 0, 2]) {
        const limit = erfc(z / Math.SQRT2) / 2;
        expectNear(
          noncentralChiSquareSurvival(mean + z * deviation, 1000, lambda),
          limit,
          0.012,
          `lambda ${lambda}, z ${z}`,
        );
      }
    }
  });

  test("noncentral: never leaves 0 to 1 and falls with x", () => {
    const range = fc.tuple(
      fc.double({ min: 0.1, max: 3000, noNaN: true }),
      fc.integer({ min: 1, max: 1000 }),
      fc.double({ min: 0, max: 5000, noNaN: true }),
    );
    fc.assert(
      fc.property(range, ([x, degrees, lambda]) => {
        const here = noncentralChiSquareSurvival(x, degrees, lambda);
        const further = noncentralChiSquareSurvival(x * 1.1, degrees, lambda);
        return here >= 0 && here <= 1 && further <= here * (1 + 1e-10);
      }),
      { seed: 1, numRuns: 100 },
    );
    for (const lambda of [-1, NaN, Infinity])
      expect(() => noncentralChiSquareSurvival(1, 2, lambda)).toThrow(RangeError);
    expect(() => upperGammaRatio(0, 1)).toThrow(RangeError);
  });
});
