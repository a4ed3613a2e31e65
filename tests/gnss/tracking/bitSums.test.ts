import { describe, expect, test } from "vitest";
import { bitFrequencyHz, bitSums, turnedBack } from "@/lib/gnss/tracking/bitSums";
import { residualFrequencyHz } from "@/lib/gnss/tracking/residualFrequency";
import { seededRandom } from "@/lib/numeric/random";
import { standardDeviation } from "@/lib/numeric/statistics";
import { expectNear } from "@/tests/support/expectNear";

const random = seededRandom("d".repeat(64), "bit sums");

/** Prompts of 1 ms with bits of 20 ms that begin at `edge`, turning at a frequency. */
function promptsOf(hz: number, edge: number, amplitude: number, noise: number): Float64Array {
  const prompts = new Float64Array(4000);
  let bit = 1;
  for (let n = 0; n < 2000; n++) {
    if (n % 20 === edge) bit = random.pick([-1, 1]);
    const angle = 2 * Math.PI * hz * n * 1e-3 + 0.7;
    prompts[2 * n] = bit * amplitude * Math.cos(angle) + noise * random.gaussian();
    prompts[2 * n + 1] = bit * amplitude * Math.sin(angle) + noise * random.gaussian();
  }
  return prompts;
}

test("sums run over whole bits, and parts of bits at the ends are left out", () => {
  const prompts = Float64Array.from({ length: 2 * 11 }, (_, at) => at); // re 0, 2, 4 ...; im 1, 3, 5 ...
  // From prompt 2: re 4 + 6 + 8 = 18, im 5 + 7 + 9 = 21, and so on; prompts 0 and 1 belong to a bit that began before.
  expect([...bitSums(prompts, 2, 3)]).toEqual([18, 21, 36, 39, 54, 57]);
  expect([...bitSums(prompts, 9, 3)]).toEqual([]);
  expect(bitSums([], 0, 20)).toHaveLength(0);
});

describe("frequency left in the sums", () => {
  test.each([0, 3.3, -4.9, 12, -12])("%d Hz without noise, whatever the bits", (hz) =>
    expectNear(bitFrequencyHz(bitSums(promptsOf(hz, 7, 1, 0), 7, 20), 0.02), hz, 1e-9, "frequency"),
  );

  // 28 dB-Hz: amplitude sqrt(2 * 631 * 1 ms) = 1.1233 for noise of 1 in I and in Q.
  test("at 28 dB-Hz it is some ten times surer than from single periods", () => {
    const [ofBits, ofPeriods] = [[], []] as number[][];
    for (let run = 0; run < 40; run++) {
      const prompts = promptsOf(4, 7, 1.1233, 1);
      ofBits.push(bitFrequencyHz(bitSums(prompts, 7, 20), 0.02) - 4);
      ofPeriods.push(residualFrequencyHz(prompts, 7, 20, 1e-3) - 4);
    }
    expect(standardDeviation(ofBits)).toBeLessThan(0.2);
    expect(standardDeviation(ofPeriods)).toBeGreaterThan(10 * standardDeviation(ofBits));
  });

  test("no sums have none", () => expect(bitFrequencyHz([], 0.02)).toBe(0));
});

test("turned back, what turned stands still", () => {
  const still = turnedBack(promptsOf(4.2, 0, 5, 0), 4.2, 1e-3);
  for (let n = 0; n < 2000; n += 97) {
    expectNear(Math.abs(still[2 * n]), 5 * Math.cos(0.7), 1e-9, `I of ${n}`);
    expectNear(Math.abs(still[2 * n + 1]), 5 * Math.sin(0.7), 1e-9, `Q of ${n}`);
  }
});
