import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { bandLimitedCode, CODE_TABLE_POINTS, highestLineInBand } from "@/lib/gnss/bandLimitedCode";
import { caCode } from "@/lib/gnss/caCode";
import { codeHarmonics } from "@/lib/gnss/codeHarmonics";
import type { Scene, SceneSatellite } from "@/lib/gnss/scene";
import { synthesizeBlocks, synthesizeCi8 } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear } from "@/tests/support/expectNear";
import { sceneOf } from "./sceneOf";

const SEED = "7c".repeat(32);
const noise = () => seededRandom(SEED, "noise");
const strong: SceneSatellite = {
  prn: 6,
  codePhaseChips: 700.4,
  dopplerHz: 3210,
  cn0DbHz: 65,
  carrierPhaseCycles: 0.2,
  dataBits: null,
  bitEdgeMs: 0,
};
const alone = (satellite: SceneSatellite | null, rateHz = 4.092e6, durationMs = 20): Scene => ({
  rateHz,
  durationMs,
  ifHz: 0,
  satellites: satellite ? [satellite] : [],
});

/**
 * Correlation of one millisecond of samples from sample `first` with rectangular chips on the given carrier, written down
 * from the definition with the engine's own functions.
 */
function correlate(samples: Int8Array, rateHz: number, first: number, s: SceneSatellite, lateChips = 0) {
  const code = caCode(s.prn);
  const chipsPerSample = (1.023e6 / rateHz) * (1 + s.dopplerHz / 1575.42e6);
  let [re, im] = [0, 0];
  for (let n = first; n < first + rateHz / 1000; n++) {
    const chip = code[Math.floor(s.codePhaseChips - lateChips + n * chipsPerSample + 1023) % 1023];
    const angle = -2 * Math.PI * (s.carrierPhaseCycles + (n * s.dopplerHz) / rateHz);
    re += chip * (samples[2 * n] * Math.cos(angle) - samples[2 * n + 1] * Math.sin(angle));
    im += chip * (samples[2 * n] * Math.sin(angle) + samples[2 * n + 1] * Math.cos(angle));
  }
  return { re, im };
}

// Fixed when the engine was first measured: an old case must come out bit for bit the same for as long as it may be
// appealed. A change here is a new engine version, never a new number in this line alone.
test("the samples of one seed never change", () => {
  const { samples, scale } = synthesizeCi8(sceneOf(SEED, 2.046e6, [3, 8, 14, 22, 31], 1200), noise());
  expect(scale).toBe(24);
  expect(createHash("sha256").update(samples).digest("hex")).toBe(
    "4a1738dd2340e7dbbebbd532054df986333e127eca167325ec7fe234e931b31d",
  );
});

test("noise alone has the stated size, no offset, and no memory", () => {
  const { samples, scale } = synthesizeCi8(alone(null, 2.046e6, 50), noise());
  expect(samples).toHaveLength(2 * 2046 * 50);
  let [sum, squares, product] = [0, 0, 0];
  for (let n = 0; n < samples.length; n++) {
    sum += samples[n];
    squares += samples[n] * samples[n];
    product += n > 1 ? samples[n] * samples[n - 2] : 0;
  }
  const count = samples.length;
  expectNear(sum / count, 0, (5 * scale) / Math.sqrt(count), "mean");
  // rounding to whole counts adds 1/12
  expectNear(squares / count / (scale * scale + 1 / 12), 1, 5 * Math.sqrt(2 / count), "power");
  expectNear(product / count / (scale * scale), 0, 5 / Math.sqrt(count), "correlation with the sample before");
});

test("the noise does not depend on the satellites", () => {
  const empty = synthesizeCi8(alone(null), noise()).samples;
  const weak = synthesizeCi8(alone({ ...strong, cn0DbHz: 30 }), noise()).samples;
  // 30 dB-Hz at 4.092 MHz is an amplitude of 24 sqrt(2 * 1000/4.092e6) = 0.53 counts; rounding may add one.
  expect(empty.reduce((most, value, n) => Math.max(most, Math.abs(value - weak[n])), 0)).toBeLessThanOrEqual(2);
});

describe("one strong satellite", () => {
  // Not 4.092 MHz: four samples to every chip would leave rectangular replicas blind within a quarter of a chip.
  const rateHz = 4.093e6;
  const { samples } = synthesizeCi8(alone(strong, rateHz, 40), noise());

  test("has its code phase, Doppler and carrier phase from the first sample to the last", () => {
    for (const first of [0, 2046, 39 * 4093]) {
      const { re, im } = correlate(samples, rateHz, first, strong);
      expect(re).toBeGreaterThan(0);
      expectNear(Math.atan2(im, re), 0, 0.05, `carrier phase in rad at sample ${first}`);
      const [early, late] = [-0.4, 0.4].map((chips) => correlate(samples, rateHz, first, strong, chips).re);
      expectNear((early - late) / re, 0, 0.04, `balance of early and late at sample ${first}`);
    }
  });

  test("has its C/N0 but for the 0.22 dB that unfiltered chips lose at 4.093 MHz", () => {
    // Power of a C/A code inside +-2.034 MHz of the infinite band: 0.950 (S02 of the published spectra: 0.223 dB).
    let power = 0;
    for (let ms = 0; ms < 40; ms++) power += correlate(samples, rateHz, ms * 4093, strong).re ** 2;
    const cn0 = 10 * Math.log10((power / 40 / (2 * 24 * 24 * 4093)) * 1000);
    expectNear(cn0, strong.cn0DbHz - 0.22, 0.06, "C/N0");
  });

  test("moves its code with the carrier: 1540 cycles are one chip", () => {
    const wrong = { ...strong, codePhaseChips: strong.codePhaseChips + 0.0811 }; // 3210/1540 * 0.0389 s
    const [right, off] = [strong, wrong].map((s) => {
      const [early, late] = [-0.4, 0.4].map((chips) => correlate(samples, rateHz, 39 * 4093, s, chips).re);
      return (early - late) / correlate(samples, rateHz, 39 * 4093, strong).re;
    });
    expectNear(off - right, -2 * 0.0811, 0.05, "early minus late of a code 0.08 chip ahead");
  });
});

test("data bits flip the sign at their edge, every 20 code periods", () => {
  const dataBits = Int8Array.from([1, -1, -1, 1]);
  const satellite = { ...strong, codePhaseChips: 0, dataBits, bitEdgeMs: 7 };
  const rateHz = 2.046e6;
  const { samples } = synthesizeCi8(alone(satellite, rateHz, 100), noise());
  const signs = Array.from({ length: 99 }, (_, ms) => Math.sign(correlate(samples, rateHz, ms * 2046, satellite).re));
  const bitOf = (ms: number) => dataBits[Math.floor((ms + 13) / 20) % 4]; // runs out after 67 ms, starts again
  expect(signs).toEqual(signs.map((_, ms) => bitOf(ms)));
});

test("a sample's value does not depend on how long the capture is", () => {
  const [short, long] = [10, 20].map((ms) => synthesizeCi8(alone(strong, 2.046e6, ms), noise()).samples);
  expect(long.slice(0, short.length)).toEqual(short);
});

test("millisecond by millisecond the samples are the same", () => {
  const scene = sceneOf(SEED, 2.046e6, [3, 8], 0);
  const whole = synthesizeCi8({ ...scene, durationMs: 5 }, noise()).samples;
  const blocks = Array.from(synthesizeBlocks({ ...scene, durationMs: 5 }, noise()), (block) => Int8Array.from(block));
  expect(blocks.map(({ length }) => length)).toEqual(Array(5).fill(4092));
  expect(blocks.flatMap((block) => [...block])).toEqual([...whole]);
});

test("reports progress to the end", () => {
  const calls: [number, number][] = [];
  synthesizeCi8(alone(null, 2.046e6, 3), noise(), (done, total) => calls.push([done, total]));
  expect(calls).toEqual([
    [1, 3],
    [2, 3],
    [3, 3],
  ]);
});

test("refuses rates without whole samples per code period and broken durations", () => {
  for (const rateHz of [2e6, 2.0465005e6, NaN])
    expect(() => synthesizeCi8(alone(null, rateHz), noise())).toThrow(RangeError);
  for (const ms of [0, 1.5, NaN]) expect(() => synthesizeCi8(alone(null, 2.046e6, ms), noise())).toThrow(RangeError);
});

describe("the code behind a front end", () => {
  test("keeps power 1 and, at full bandwidth, the chips themselves", () => {
    const table = bandLimitedCode(9, 16_000);
    let power = 0;
    for (let n = 0; n < CODE_TABLE_POINTS; n++) power += table[n] * table[n];
    expectNear(power / CODE_TABLE_POINTS, 1, 1e-9, "power");
    caCode(9).forEach((chip, n) => {
      const middle = table[Math.round(((n + 0.5) * CODE_TABLE_POINTS) / 1023)];
      expectNear(middle, chip, 0.1, `middle of chip ${n}`);
    });
  });

  test("at 2.046 MHz loses the part of the band that 0.9028 of the power fills", () => {
    // S02: BPSK(1) in 2.046 MHz, fraction 0.902823 of a random code; one code's lines scatter around it.
    const lines = codeHarmonics(9, 1023);
    let power = lines[0] ** 2;
    for (let k = 1; k <= 1023; k++) power += 2 * (lines[2 * k] ** 2 + lines[2 * k + 1] ** 2);
    expectNear(power, 0.9028, 0.01, "power inside +-1.023 MHz");
    expect(highestLineInBand(2046)).toBe(1011);
  });

  // S07: strongest line of the C/A spectrum, Parkinson & Spilker, Global Positioning System, and Kaplan & Hegarty.
  test.each(formulaCases("S07"))("$name", ({ given, expected }) => {
    const lines = codeHarmonics(given.prn, 511);
    const levels = Array.from({ length: 511 }, (_, k) => lines[2 * k + 2] ** 2 + lines[2 * k + 3] ** 2);
    const worst = Math.max(...levels);
    expect(levels.indexOf(worst) + 1).toBe(expected.kHz);
    expectNear(10 * Math.log10(worst), expected.dB, 0.0051, "level of the line");
  });
});
