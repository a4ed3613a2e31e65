import { describe, expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { exactCorrelation } from "@/lib/gnss/exactCorrelation";
import { codeHarmonics } from "@/lib/gnss/codeHarmonics";
import { chipAtSample, sampledCode } from "@/lib/gnss/sampledCode";
import { sampledCorrelation } from "@/lib/gnss/sampledCorrelation";
import reference from "@/tests/reference/code-correlations.json";
import { expectNear } from "@/tests/support/expectNear";

const CHIP_RATE_HZ = 1_023_000;

describe.each(Object.entries(reference.sampled))("%s Msps", (_name, given) => {
  const samples = sampledCode(caCode(given.prn), CHIP_RATE_HZ, given.fs_hz, given.samples_per_ms);

  test("each sample takes the chip of a second program", () => {
    const indices = given.chip_index_first_24.map((_, n) => chipAtSample(n, CHIP_RATE_HZ, given.fs_hz));
    expect(indices).toEqual(given.chip_index_first_24);
    indices.forEach((chip, n) => expect(samples[n]).toBe(caCode(given.prn)[chip]));
    expect(samples.reduce((sum, value) => sum + value, 0)).toBe(given.sum_of_samples);
  });

  test("autocorrelation at the first lags", () => {
    const values = sampledCorrelation(samples, samples);
    given["circular_autocorr_lag_0..8"].forEach((sum, lag) =>
      expectNear(values[lag] * given.samples_per_ms, sum, 1e-6, `lag ${lag}`),
    );
  });
});

describe("sampledCorrelation behind a front end", () => {
  const RATE_HZ = 32_736_000;
  const code = sampledCode(caCode(7), CHIP_RATE_HZ, RATE_HZ, 32_736);

  // Parseval: what is left at lag 0 is the power of the lines that pass, known from the code's Fourier series. Chips held
  // for 32 samples each have lines larger by x/sin x, x = pi k / (32 * 1023), than chips without steps.
  test.each([2.046e6, 4.092e6, 8.184e6])("%d Hz leave the power of the lines inside", (bandwidthHz) => {
    const lines = codeHarmonics(7, bandwidthHz / 2000);
    let power = lines[0] * lines[0];
    for (let k = 1; 2 * k < lines.length; k++) {
      const x = (Math.PI * k) / (32 * 1023);
      const held = (x / Math.sin(x)) ** 2;
      power += 2 * held * (lines[2 * k] * lines[2 * k] + lines[2 * k + 1] * lines[2 * k + 1]);
    }
    const values = sampledCorrelation(code, code, { rateHz: RATE_HZ, bandwidthHz });
    expectNear(values[0], power, 1e-9, "share of the power");
  });

  // S02 of the formulas: 0.9028 of a random code's power lies within the main lobe; a C/A code has lines of its own.
  test("the main lobe holds nine tenths", () =>
    expectNear(
      sampledCorrelation(code, code, { rateHz: RATE_HZ, bandwidthHz: 2.046e6 })[0],
      0.902823,
      0.01,
      "share of the power",
    ));

  test("a narrow front end rounds the peak, a wide one leaves the triangle", () => {
    const early = 16; // samples, half a chip
    const narrow = sampledCorrelation(code, code, { rateHz: RATE_HZ, bandwidthHz: 2.046e6 });
    const wide = sampledCorrelation(code, code, { rateHz: RATE_HZ, bandwidthHz: 30e6 });
    expect(narrow[early] / narrow[0]).toBeGreaterThan(wide[early] / wide[0] + 0.03);
    // Half-way between the whole lags 0 and 1 the triangle is their mean.
    const whole = exactCorrelation(caCode(7), caCode(7)).periodic;
    expectNear(wide[early] / wide[0], (whole[0] + whole[1]) / 2 / 1023, 0.005, "half a chip off");
  });

  test("shifting one signal moves the peak by that much", () => {
    const later = code.map((_, n) => code[(n + code.length - 100) % code.length]);
    const values = sampledCorrelation(code, later, { rateHz: RATE_HZ, bandwidthHz: 4.092e6 });
    expect(values.indexOf(Math.max(...values))).toBe(100);
  });
});

test("refuses unequal lengths, bandwidths of nothing and rates that are not whole", () => {
  expect(() => sampledCorrelation([1, 1], [1])).toThrow(RangeError);
  expect(() => sampledCorrelation([1, 1], [1, 1], { rateHz: 2, bandwidthHz: 0 })).toThrow(RangeError);
  expect(() => sampledCode(caCode(1), 1.5, 4, 4)).toThrow(RangeError);
  expect(() => sampledCode(caCode(1), CHIP_RATE_HZ, 0, 4)).toThrow(RangeError);
  expect(() => sampledCode(caCode(1), CHIP_RATE_HZ, 4_092_000, 1e10)).toThrow(RangeError);
});
