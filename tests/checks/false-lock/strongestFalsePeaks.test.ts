import { describe, expect, test } from "vitest";
import { strongestFalsePeaks } from "@/lib/checks/false-lock/strongestFalsePeaks";
import { bandLimitedCode, CODE_TABLE_POINTS, highestLineInBand } from "@/lib/gnss/bandLimitedCode";
import { falsePeaks } from "@/lib/gnss/falseLock";
import { expectNear } from "@/tests/support/expectNear";

const parent = { prn: 5, dopplerHz: 1730, cn0DbHz: 52 };
const places = strongestFalsePeaks(parent, 4, 2_046_000);

test("stand at the parent's Doppler plus or minus whole kHz, inside the search", () => {
  for (const { dopplerHz } of places) {
    expect(Number.isInteger((dopplerHz - 1730) / 1000)).toBe(true);
    expect(Math.abs(dopplerHz)).toBeLessThanOrEqual(6000);
  }
});

test("one for each Doppler, the highest first, as far as 3 dB under it", () => {
  expect(new Set(places.map(({ dopplerHz }) => dopplerHz)).size).toBe(places.length);
  places.forEach(({ levelDb, apparentCn0DbHz }, n) => {
    if (n > 0) expect(levelDb).toBeLessThanOrEqual(places[n - 1].levelDb);
    expect(levelDb).toBeGreaterThanOrEqual(places[0].levelDb - 3);
    expectNear(apparentCn0DbHz, 52 + levelDb, 1e-9, "apparent C/N0");
  });
});

test("a satellite of 52 dB-Hz shows as 28 to 32 dB-Hz", () => {
  // 23.9 dB at equal Doppler, up to 21.1 dB at whole kHz (Kaplan & Hegarty, Understanding GPS, 2nd ed., from memory); up to
  // one dB more between whole chips, behind a filter.
  expect(places[0].apparentCn0DbHz).toBeGreaterThan(52 - 23.94);
  expect(places[0].apparentCn0DbHz).toBeLessThan(52 - 21.08 + 1);
});

test("are close to the chip-by-chip correlation of the two codes", () => {
  const chipwise = falsePeaks({
    parentPrn: 5,
    victimPrn: 4,
    parentDopplerHz: 1730,
    parentCn0DbHz: 52,
    coherentMs: 10,
    sums: 10,
    dopplerHalfWidthHz: 6000,
  });
  expectNear(places[0].levelDb, chipwise[0].levelDb, 1, "highest level");
});

describe("levels are those of the two filtered codes, summed point by point", () => {
  // Every eighth point of the table: 4 per chip, twice what 1 011 lines need.
  const step = 8;
  const points = CODE_TABLE_POINTS / step;
  const filtered = (prn: number) =>
    bandLimitedCode(prn, highestLineInBand(2046)).filter((_, n) => n % step === 0 && n < CODE_TABLE_POINTS);
  const [five, four] = [filtered(5), filtered(4)];

  /** |mean of p(t) v(t + lag) exp(-2 pi i m t)|^2, highest over all lags. */
  const summed = (lines: number) => {
    const re = five.map((value, n) => value * Math.cos((2 * Math.PI * lines * n) / points));
    const im = five.map((value, n) => value * Math.sin((2 * Math.PI * lines * n) / points));
    let top = 0;
    for (let lag = 0; lag < points; lag++) {
      let [sumRe, sumIm] = [0, 0];
      for (let n = 0; n < points; n++) {
        const other = four[(n + lag) % points];
        sumRe += re[n] * other;
        sumIm += im[n] * other;
      }
      top = Math.max(top, sumRe * sumRe + sumIm * sumIm);
    }
    return 10 * Math.log10(top / points / points);
  };

  test.each([0, places.length - 1])("place %i", { timeout: 60_000 }, (n) => {
    const { dopplerHz, levelDb } = places[n];
    expectNear(levelDb, summed((dopplerHz - 1730) / 1000), 0.01, "level in dB");
  });
});
