import { describe, expect, test } from "vitest";
import { acquire } from "@/lib/gnss/acquire";
import { falsePeaks } from "@/lib/gnss/falseLock";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

// The published run: PRN 5 at 52 dB-Hz and 1730 Hz, PRN 4 absent, 10 ms x 10.
const question = {
  parentPrn: 5,
  victimPrn: 4,
  parentDopplerHz: 1730,
  parentCn0DbHz: 52,
  coherentMs: 10,
  sums: 10,
  dopplerHalfWidthHz: 9000,
};
const modulo = (value: number, base: number) => value - base * Math.floor(value / base);

describe("the published run", () => {
  const peaks = falsePeaks(question);

  test("all false peaks stand whole kHz from the parent, inside the window", () => {
    for (const { dopplerHz } of peaks) {
      expect(modulo(dopplerHz - 1730, 1000)).toBe(0);
      expect(Math.abs(dopplerHz)).toBeLessThanOrEqual(9000);
    }
  });

  test("many are nearly equal; the highest is the 90.333 of 1023 chips of the tables", () => {
    expectNear(peaks[0].levelDb, -21.0806, 5e-4, "level"); // S10
    expectNear(peaks[0].apparentCn0DbHz, 52 - 21.0806, 5e-4, "apparent C/N0");
    expect(peaks.filter(({ levelDb }) => levelDb > peaks[0].levelDb - 0.7).length).toBeGreaterThanOrEqual(6);
    const levels = peaks.map(({ levelDb }) => levelDb);
    expect(levels).toEqual([...levels].sort((a, b) => b - a));
    expect(levels.at(-1)).toBeGreaterThan(levels[0] - 3.0001);
  });

  test("a real search of a capture without the satellite locks on one of them", () => {
    const rateHz = 2.046e6;
    const seed = "c4".repeat(32);
    const random = seededRandom(seed, "bits");
    const parent = {
      prn: 5,
      codePhaseChips: 311.25,
      dopplerHz: 1730,
      cn0DbHz: 52,
      carrierPhaseCycles: 0.4,
      dataBits: Int8Array.from({ length: 7 }, () => (random.uniform() < 0.5 ? -1 : 1)),
      bitEdgeMs: 11,
    };
    const { samples } = synthesizeCi8(
      { rateHz, durationMs: 100, ifHz: 0, satellites: [parent] },
      seededRandom(seed, "noise"),
    );
    const window = { coherentMs: 10, sums: 10, dopplerHalfWidthHz: 3300, dopplerStepHz: 50 };
    const [search] = acquire({ samples, rateHz }, { ...window, falseAlarmPerSearch: 1e-3, prns: [4] });
    expect(search.found).toBe(true);
    const match = peaks.find(
      ({ dopplerHz, lagChips }) =>
        Math.abs(search.dopplerHz - dopplerHz) <= 25 &&
        Math.abs(modulo(search.codePhaseChips - parent.codePhaseChips - lagChips + 2, 1023) - 2) <= 0.5,
    );
    expect(match).toBeDefined();
    expectNear(search.cn0DbHz, match!.apparentCn0DbHz, 1.5, "apparent C/N0");
  });
});

test("at equal Doppler alone two codes leave 23.94 dB", () => {
  const peaks = falsePeaks({ ...question, parentDopplerHz: 0, dopplerHalfWidthHz: 500 });
  expectNear(peaks[0].levelDb, -23.9392, 5e-4, "level"); // S10
  expect(new Set(peaks.map(({ dopplerHz }) => dopplerHz))).toEqual(new Set([0]));
});

test("a 1 ms sum also sees the half kHz, a longer one does not", () => {
  const halves = (coherentMs: number) =>
    falsePeaks({ ...question, coherentMs }).filter(({ dopplerHz }) => modulo(dopplerHz - 1730, 1000) === 500).length;
  expect(halves(1)).toBeGreaterThan(0);
  expect(halves(2)).toBe(0);
});

// Simulated by a second program, +-5 kHz: what a plan sees of false peaks of 27 and 24 dB-Hz. Printed to two digits.
test.each([
  [27, 4, 20, 0.62],
  [24, 4, 20, 0.02],
  [27, 4, 10, 0.1],
  [27, 10, 10, 0.98],
])("a false peak of %i dB-Hz is seen by %i ms x %i with probability %d", (cn0DbHz, coherentMs, sums, printed) => {
  const parentCn0DbHz = cn0DbHz + 21.0806; // the pair's highest peak
  const [highest] = falsePeaks({ ...question, parentCn0DbHz, coherentMs, sums, dopplerHalfWidthHz: 5000 });
  expectNear(highest.apparentCn0DbHz, cn0DbHz, 1e-3, "apparent C/N0");
  expectNear(highest.detection, printed, 0.005, "detection");
});

test("a window that holds no whole kHz from the parent holds no false peak", () =>
  expect(falsePeaks({ ...question, parentDopplerHz: 730, dopplerHalfWidthHz: 100 })).toEqual([]));

test("refuses broken milliseconds and unknown satellites", () => {
  expect(() => falsePeaks({ ...question, coherentMs: 0.5 })).toThrow(RangeError);
  expect(() => falsePeaks({ ...question, victimPrn: 64 })).toThrow(RangeError);
});
