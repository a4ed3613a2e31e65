import { expect, test } from "vitest";
import { selfLikeness } from "@/lib/gnss/interference/selfLikeness";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const random = seededRandom("0".repeat(64), "likeness");
const samples = Float64Array.from({ length: 2 * 256 }, () => random.gaussian());

// A second way: the sums as they are defined, block by block.
test("is the magnitude of the mean product of a sample and a later one", () => {
  const points = 64;
  const { magnitude, stepS } = selfLikeness(samples, 1000, 32, points);
  expect(stepS).toBe(0.001);
  for (const lag of [0, 1, 7, 31]) {
    let [re, im] = [0, 0];
    for (let block = 0; block < 4; block++)
      for (let n = block * points; n + lag < (block + 1) * points; n++) {
        const [a, b, c, d] = [samples[2 * n], samples[2 * n + 1], samples[2 * (n + lag)], samples[2 * (n + lag) + 1]];
        re += a * c + b * d;
        im += a * d - b * c;
      }
    expectNear(magnitude[lag], Math.hypot(re, im) / (4 * (points - lag)), 1e-9, `lag ${lag}`);
  }
});

test("what repeats every 16 samples comes back to its power after 16", () => {
  const repeated = Float64Array.from({ length: 512 }, (_, n) => samples[n % 32]);
  const { magnitude } = selfLikeness(repeated, 1000, 40, 128);
  for (const lag of [16, 32]) expectNear(magnitude[lag] / magnitude[0], 1, 0.1, `lag ${lag}`);
  expect(magnitude[8] / magnitude[0]).toBeLessThan(0.7);
});

test("refuses lags that a block cannot hold", () => {
  expect(() => selfLikeness(samples, 1000, 40, 64)).toThrow(RangeError);
  expect(() => selfLikeness(samples, 1000, 10, 512)).toThrow(RangeError);
});
