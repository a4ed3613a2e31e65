import { describe, expect, test } from "vitest";
import { createInterference } from "@/lib/gnss/interference/addInterference";
import type { Interferer } from "@/lib/gnss/interference/interferer";
import { measureInterference, powerOfJs } from "@/lib/gnss/interference/measureInterference";
import { powerSpectrum, spectrogram } from "@/lib/gnss/interference/spectrum";
import { windowOf } from "@/lib/gnss/interference/window";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

const RATE_HZ = 4.092e6;
const random = (name: string) => seededRandom("d".repeat(64), name);

function samplesOf(interferer: Interferer, count: number, cuts: number[] = []): Float64Array {
  const source = createInterference(interferer, RATE_HZ, random("source"));
  const samples = new Float64Array(2 * count);
  const places = [0, ...cuts, count];
  for (let n = 1; n < places.length; n++) source.addTo(samples.subarray(2 * places[n - 1], 2 * places[n]));
  return samples;
}
const meanPower = (samples: Float64Array) =>
  samples.reduce((sum, value) => sum + value * value, 0) / (samples.length / 2);
const captureOf = (samples: Float64Array) => ({ samples, complex: true, rateHz: RATE_HZ, ifHz: 0 });
const HANN = { points: 1024, window: "hann", step: 512 } as const;

const KINDS: [string, Interferer, number][] = [
  ["tone", { kind: "tone", power: 3, offsetHz: 311e3, phaseCycles: 0.2 }, 3],
  ["narrow FM", { kind: "narrow-fm", power: 3, offsetHz: -5e5, deviationHz: 20e3, modulationHz: 1e3 }, 3],
  ["saw sweep", { kind: "sweep", power: 3, offsetHz: 2e5, widthHz: 2e6, periodS: 30e-6, shape: "saw" }, 3],
  ["triangle sweep", { kind: "sweep", power: 3, offsetHz: 0, widthHz: 2e6, periodS: 77e-6, shape: "triangle" }, 3],
  ["pulse", { kind: "pulse", power: 3, offsetHz: 1e5, periodS: 1e-4, onShare: 0.1 }, 0.3],
  ["noise", { kind: "noise", power: 3, offsetHz: -3e5, widthHz: 1e6 }, 3],
  ["matched code", { kind: "matched-code", power: 3, prn: 9, codePhaseChips: 1022.9, dopplerHz: 2300 }, 3],
];

describe("an interference", () => {
  test.each(KINDS)("of %s has the power asked for", (_name, interferer, expected) =>
    expectNearRelative(meanPower(samplesOf(interferer, 204_600)), expected, 0.02, "mean power"),
  );

  test.each(KINDS)("of %s does not depend on how the samples are cut, and is the same again", (_name, interferer) => {
    const whole = samplesOf(interferer, 5000);
    expect(samplesOf(interferer, 5000, [1, 999, 1000, 4321])).toEqual(whole);
  });

  test("is added to what is there", () => {
    const block = Float64Array.from({ length: 20 }, (_, n) => n);
    createInterference({ kind: "tone", power: 1, offsetHz: 0, phaseCycles: 0 }, RATE_HZ, random("x")).addTo(block);
    expect([...block.subarray(0, 4)]).toEqual([1, 1, 3, 3]);
  });

  test("beyond the front end does not come in", () => {
    const beyond = samplesOf({ kind: "tone", power: 3, offsetHz: 2.1e6, phaseCycles: 0 }, 100);
    expect(meanPower(beyond)).toBe(0);
    // a sweep of twice the band is seen half of the time
    const wide = samplesOf(
      { kind: "sweep", power: 3, offsetHz: 0, widthHz: 2 * RATE_HZ, periodS: 1e-4, shape: "saw" },
      40_920,
    );
    expectNear(meanPower(wide), 1.5, 0.02, "mean power");
  });

  test.each([
    [{ kind: "tone", power: -1, offsetHz: 0, phaseCycles: 0 }],
    [{ kind: "pulse", power: 1, offsetHz: 0, periodS: 1e-3, onShare: 0 }],
    [{ kind: "sweep", power: 1, offsetHz: 0, widthHz: 0, periodS: 1e-3, shape: "saw" }],
    [{ kind: "sweep", power: 1, offsetHz: 0, widthHz: 1e6, periodS: 0, shape: "saw" }],
    [{ kind: "noise", power: 1, offsetHz: 0, widthHz: NaN }],
    [{ kind: "narrow-fm", power: 1, offsetHz: 0, deviationHz: 1, modulationHz: 0 }],
  ] as [Interferer][])("that cannot be is refused: %j", (wrong) =>
    expect(() => createInterference(wrong, RATE_HZ, random("x"))).toThrow(RangeError),
  );
});

describe("a spectrum", () => {
  // Harris 1978, Table I: equivalent noise bandwidth in bins.
  test.each([
    ["rectangular", 1],
    ["hann", 1.5],
    ["blackman-harris", 2],
  ] as const)("behind a %s window has a noise bandwidth of %s bins", (name, bins) =>
    expectNear(windowOf(name, 1024).noiseBandwidthBins, bins, 0.005, "bins"),
  );

  test("adds up to the power of the samples (Parseval)", () => {
    const noise = Float64Array.from({ length: 65_536 }, random("white").gaussian);
    const { densityPerHz, offsetsHz } = powerSpectrum(captureOf(noise), {
      points: 256,
      window: "rectangular",
      step: 256,
    });
    const total = densityPerHz.reduce((sum, value) => sum + value, 0) * (offsetsHz[1] - offsetsHz[0]);
    expectNearRelative(total, meanPower(noise), 1e-9, "power");
  });

  test("states a tone's place and, times the resolution bandwidth, its power", () => {
    const offsetHz = 83 * (RATE_HZ / 1024);
    const { densityPerHz, offsetsHz, resolutionHz } = powerSpectrum(
      captureOf(samplesOf({ kind: "tone", power: 3, offsetHz, phaseCycles: 0 }, 4096)),
      HANN,
    );
    const peak = densityPerHz.indexOf(Math.max(...densityPerHz));
    expectNear(offsetsHz[peak], offsetHz, 1e-6, "place");
    expectNear(resolutionHz, (1.5 * RATE_HZ) / 1024, 1e-6, "resolution bandwidth");
    expectNearRelative(densityPerHz[peak] * resolutionHz, 3, 1e-9, "power");
  });

  test("of real samples at an intermediate frequency is counted from the carrier", () => {
    const samples = Float64Array.from({ length: 8192 }, (_, n) => 2 * Math.cos((2 * Math.PI * n * 300) / 1024));
    const real = { samples, complex: false, rateHz: 1024e3, ifHz: 250e3 };
    const { densityPerHz, offsetsHz, resolutionHz } = powerSpectrum(real, HANN);
    const peak = densityPerHz.indexOf(Math.max(...densityPerHz));
    expectNear(offsetsHz[peak], 50e3, 1e-6, "place");
    expectNearRelative(densityPerHz[peak] * resolutionHz, 2, 1e-9, "power of 2 cos");
  });

  test("in time shows a sweep's frequency rise and fall back", () => {
    const sweep: Interferer = { kind: "sweep", power: 1, offsetHz: 0, widthHz: 2e6, periodS: 1e-3, shape: "saw" };
    const rows = spectrogram(captureOf(samplesOf(sweep, 8184)), { points: 128, window: "hann", step: 128 });
    const width = rows.offsetsHz.length;
    rows.timesS.forEach((timeS, n) => {
      const row = rows.densityPerHz.subarray(n * width, (n + 1) * width);
      const expected = 2e6 * (((timeS * 1e3) % 1) - 0.5);
      if (Math.abs(expected) < 0.9e6)
        // where the row does not hold the jump
        expectNear(rows.offsetsHz[row.indexOf(Math.max(...row))], expected, 50e3, `frequency at ${timeS} s`);
    });
    expect(rows.timesS.length).toBe(63);
  });

  test("longer than the capture or without steps is refused", () => {
    expect(() => powerSpectrum(captureOf(new Float64Array(100)), HANN)).toThrow(RangeError);
    expect(() => powerSpectrum(captureOf(new Float64Array(8192)), { ...HANN, step: 0 })).toThrow(RangeError);
  });
});

describe("a measurement", () => {
  const readingOf = (interferer: Interferer | null, averages = 200) => {
    const draws = random("floor");
    const samples = interferer ? samplesOf(interferer, 512 * (averages + 1)) : new Float64Array(1024 * (averages + 1));
    for (let n = 0; n < samples.length; n++) samples[n] += draws.gaussian();
    return measureInterference(powerSpectrum(captureOf(samples), HANN));
  };

  test("of noise alone finds the floor and hardly any power", () => {
    const reading = readingOf(null);
    // Variance 1 in I and in Q over the rate: definition of the density.
    expectNearRelative(reading.floorPerHz, 2 / RATE_HZ, 0.02, "floor");
    expect(reading.power).toBeLessThan(0.05);
  });

  test("gives back J/S, place and width", () => {
    const jsDb = 25;
    const power = powerOfJs(jsDb, 45, 1, RATE_HZ);
    for (const [interferer, centreHz, occupiedHz, within] of [
      [{ kind: "tone", power, offsetHz: 4e5, phaseCycles: 0 }, 4e5, 12e3, 8e3],
      [{ kind: "narrow-fm", power, offsetHz: -6e5, deviationHz: 50e3, modulationHz: 1e3 }, -6e5, 102e3, 12e3],
      [{ kind: "sweep", power, offsetHz: 2e5, widthHz: 1e6, periodS: 50e-6, shape: "triangle" }, 2e5, 1e6, 60e3],
      // twelve-pole edges hold half a per cent beyond 1.1 times the 3 dB width, as far as the floor lets them be seen
      [{ kind: "noise", power, offsetHz: -3e5, widthHz: 8e5 }, -3e5, 8.4e5, 40e3],
    ] as [Interferer, number, number, number][]) {
      const reading = readingOf(interferer);
      expectNear(reading.powerToDensityDbHz - 45, jsDb, 0.4, `${interferer.kind}: J/S`);
      expectNear(reading.centreHz, centreHz, 15e3, `${interferer.kind}: centre`);
      expectNear(reading.occupiedHz, occupiedHz, within, `${interferer.kind}: width`);
    }
  });
});
