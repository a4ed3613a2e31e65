import { describe, expect, test } from "vitest";
import { createSampleDecoder } from "@/lib/formats/decodeSamples";
import { describeSamples } from "@/lib/formats/describeSamples";
import { sampleFormatNamed } from "@/lib/formats/sampleFormat";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const facts = (name: string, values: readonly number[]) =>
  describeSamples(Float32Array.from(values), sampleFormatNamed(name)!);

// Mean, variance and counts of a few numbers: by hand.
test("offset of I and Q, power without it, counts by value", () => {
  const { samples, offset, rms, lowest, highest, clippedShare, histogram } = facts("ci8", [3, -1, 1, -1, 3, -1, 1, -1]);
  expect([samples, offset, lowest, highest, clippedShare]).toEqual([4, [2, -1], -1, 3, 0]);
  expectNear(rms, Math.sqrt(0.5), 1e-12, "rms"); // I varies by 1, Q not at all
  expect([...histogram.centres]).toEqual([-1, 0, 1, 2, 3]);
  expect([...histogram.counts]).toEqual([4, 0, 2, 0, 2]);
});

// The ends of a format are those of its integers: -128 and 127, 0 and 255, -32768 and 32767 (two's complement).
describe("values at an end of the format are clipped", () => {
  test.each([
    ["ri8", [-128, 127, 126, 0], 0.5],
    ["ri16_le", [-32768, 127, 32767, 0], 0.5],
    ["cf32_le", [1, -1, 0.5, 2], null],
  ])("%s", (name, values, share) => expect(facts(name, values).clippedShare).toBe(share));

  test("of unsigned numbers after decoding", () => {
    const format = sampleFormatNamed("ru8")!;
    const values = createSampleDecoder(format).push(Uint8Array.from([0, 255, 128, 127]));
    expect(describeSamples(values, format).clippedShare).toBe(0.5);
  });
});

// A full-scale sine has a level of -3.01 dB: half the square of its amplitude.
test("the level is told below the largest value of the format", () => {
  const sine = Array.from({ length: 4096 }, (_, n) => 32767 * Math.sin((2 * Math.PI * 5 * n) / 4096));
  expectNear(facts("ri16_le", sine).levelDb, -3.0103, 1e-3, "level");
  expect(facts("ri16_le", [0, 0]).levelDb).toBe(-Infinity);
});

// Normal law: 68.27 % within one standard deviation (tables of the error function).
test("a histogram holds every value once, in at most 64 bins", () => {
  const random = seededRandom("7e".repeat(32), "noise");
  const noise = Array.from({ length: 40_000 }, () => random.gaussian());
  const { histogram } = facts("rf32_le", noise);
  expect(histogram.counts.length).toBe(64);
  expect(histogram.counts.reduce((sum, count) => sum + count, 0)).toBe(40_000);
  const inside = histogram.counts.reduce(
    (sum, count, bin) => sum + (Math.abs(histogram.centres[bin]) < 1 ? count : 0),
    0,
  );
  expectNear(inside / 40_000, 0.6827, 0.04, "share within one sigma"); // bins are up to 0.15 sigma wide
  expect(
    facts(
      "ri16_le",
      noise.map((value) => Math.round(300 * value)),
    ).histogram.counts.length,
  ).toBeLessThanOrEqual(64);
});

test("a recording without samples is refused", () => expect(() => facts("ci8", [])).toThrow(RangeError));
