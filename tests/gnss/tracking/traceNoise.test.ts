import { expect, test } from "vitest";
import { boc, bpsk } from "@/lib/gnss/spectra/modulation";
import { correlationShape } from "@/lib/gnss/tracking/correlationShape";
import { traceNoise } from "@/lib/gnss/tracking/traceNoise";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const random = seededRandom("c".repeat(64), "trace noise");
const RUNS = 1500;

// Power within +-B/2 of the whole: 0.902823 of BPSK(1) in 2.046 MHz and 0.855707 of BOC(1,1) in 4.092 MHz, from a
// quadrature by a second program; the first is the 0.903 of the textbooks' main lobe.
test.each([
  ["BPSK(1)", bpsk(1), 2.046e6, 0.902823],
  ["BOC(1,1)", boc(1, 1), 4.092e6, 0.855707],
])("%s: I and Q have the power that the filter lets through", (_name, modulation, bandwidthHz, share) => {
  let [i2, q2, iq] = [0, 0, 0];
  for (let run = 0; run < RUNS; run++) {
    const noise = traceNoise(modulation, bandwidthHz, { fromChips: 0, stepChips: 1, count: 3 }, random);
    i2 += (noise[0] * noise[0]) / RUNS;
    q2 += (noise[5] * noise[5]) / RUNS;
    iq += (noise[2] * noise[3]) / RUNS;
  }
  // The mean of 1500 squares scatters by the root of 2/1500, 3.7 %; four of them.
  expectNear(i2, share, 0.15 * share, "I");
  expectNear(q2, share, 0.15 * share, "Q");
  expectNear(iq, 0, 0.11, "I times Q");
});

// Noise through a correlator is correlated from lag to lag as the signal's own correlation: textbook.
test("noise at two lags is alike as the correlation shape says", () => {
  const shape = correlationShape(boc(1, 1), 8e6);
  const sums = new Float64Array(11);
  for (let run = 0; run < RUNS; run++) {
    const noise = traceNoise(boc(1, 1), 8e6, { fromChips: 4, stepChips: 0.1, count: 11 }, random);
    sums.forEach((_, n) => {
      sums[n] += (noise[0] * noise[2 * n] + noise[1] * noise[2 * n + 1]) / (2 * RUNS);
    });
  }
  sums.forEach((sum, n) => expectNear(sum, shape(n / 10), 0.08, `${n / 10} chips apart`));
});

test("a stretch in which it would repeat, and no bandwidth, are refused", () => {
  const lags = { fromChips: 0, stepChips: 0.1, count: 161 };
  expect(() => traceNoise(boc(1, 1), 8e6, lags, random)).toThrow(/at most 16 chips/);
  expect(() => traceNoise(boc(1, 1), 0, { ...lags, count: 10 }, random)).toThrow(RangeError);
});
