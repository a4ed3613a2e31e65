import { describe, expect, test } from "vitest";
import { stretchSpectrogram } from "@/lib/gnss/interference/stretchSpectrogram";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const RATE_HZ = 1e6;

/** White noise of power 1; within `burst` a tone at 125 kHz above it, written down from its definition. */
function capture(count: number, burst: readonly [number, number] | null, ifHz = 0): SampledCapture {
  const random = seededRandom("61".repeat(32), "noise");
  const samples = new Float32Array(2 * count);
  for (let n = 0; n < count; n++) {
    const amplitude = burst && n >= burst[0] && n < burst[1] ? 3 : 0;
    samples[2 * n] = amplitude * Math.cos((2 * Math.PI * n) / 8) + Math.SQRT1_2 * random.gaussian();
    samples[2 * n + 1] = amplitude * Math.sin((2 * Math.PI * n) / 8) + Math.SQRT1_2 * random.gaussian();
  }
  return { samples, complex: true, rateHz: RATE_HZ, ifHz };
}
const highest = (values: ArrayLike<number>) => Array.from(values).indexOf(Math.max(...Array.from(values)));
const rowOf = (densities: Float64Array, columns: number, row: number) =>
  densities.subarray(row * columns, (row + 1) * columns);

describe("a burst of 1 ms in 200 ms", () => {
  const given = capture(200_000, [77_000, 78_000], 200e3);
  const { offsetsHz, densityPerHz, timesS, resolutionHz, rowS, averaged } = stretchSpectrogram(given, {
    fromS: 0,
    lengthS: null,
  });

  test("stands in its row, at its place from the carrier", () => {
    const at = highest(densityPerHz);
    expectNear(timesS[Math.floor(at / offsetsHz.length)], 0.0775, rowS / 2, "time of the burst, s");
    expectNear(offsetsHz[at % offsetsHz.length], 125e3 - 200e3, resolutionHz / 2, "place of the tone, Hz");
  });

  test("rows follow each other without a gap, and say what they stand for", () => {
    expect(timesS).toHaveLength(200);
    // 512 points are nearest to the root of 200 000, 447, in octaves; 512 + 2 x 256 samples cover the 1000 of a row.
    expectNear(rowS, 1.024e-3, 1e-9, "length of a row, s");
    for (let row = 1; row < timesS.length; row++)
      expect(timesS[row] - timesS[row - 1]).toBeLessThanOrEqual(rowS + 1e-9);
    expectNear(timesS[199] + rowS / 2, 0.2, 1e-6, "end of the last row, s");
    expect(offsetsHz).toHaveLength(512);
    expectNear(resolutionHz, (2.0044 * RATE_HZ) / 512, 2, "resolution, Hz"); // two bins by the window: Harris, 1978
    expect(averaged).toBe(3);
  });

  test("a row without it holds the density of the noise, 1 per sampling rate", () => {
    const row = rowOf(densityPerHz, offsetsHz.length, 10);
    const mean = row.reduce((sum, value) => sum + value, 0) / row.length;
    expectNear(mean * RATE_HZ, 1, 0.1, "density of the noise times the rate");
  });
});

test("a short stretch is resolved finely in time", () => {
  const given = capture(20_000, [5200, 5232]);
  const { timesS, densityPerHz, offsetsHz, rowS } = stretchSpectrogram(given, { fromS: 0.005, lengthS: 0.001 });
  expectNear(rowS, 32e-6, 1e-12, "length of a row, s"); // 32 points are nearest to the root of 1000 in octaves
  expectNear(timesS[0], 0.005 + 16e-6, 1e-9, "middle of the first row, s");
  const at = highest(densityPerHz);
  expectNear(timesS[Math.floor(at / offsetsHz.length)], 0.005216, 16e-6, "time of the burst, s");
});

test("real samples give the half from 0 Hz up", () => {
  const samples = Float32Array.from({ length: 4096 }, (_, n) => Math.cos((2 * Math.PI * n) / 4));
  const real = { samples, complex: false, rateHz: RATE_HZ, ifHz: 0 };
  const { offsetsHz, densityPerHz } = stretchSpectrogram(real, { fromS: 0, lengthS: null });
  expect(offsetsHz[0]).toBe(0);
  expect(offsetsHz[highest(rowOf(densityPerHz, offsetsHz.length, 3))]).toBe(RATE_HZ / 4);
});

test.each([
  ["begins behind the end", { fromS: 1, lengthS: null }],
  ["is too short", { fromS: 0, lengthS: 20e-6 }],
  ["is no number", { fromS: NaN, lengthS: null }],
])("refuses a stretch that %s", (_, stretch) => {
  expect(() => stretchSpectrogram(capture(1000, null), stretch)).toThrow(RangeError);
});
