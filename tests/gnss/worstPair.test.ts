import { describe, expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { correlationLevels } from "@/lib/gnss/correlationLevels";
import { dopplerCorrelation } from "@/lib/gnss/crossCorrelation";
import { dopplerPairs } from "@/lib/gnss/dopplerPairs";
import { exactCorrelation } from "@/lib/gnss/exactCorrelation";
import { chipsOf } from "@/lib/gnss/shiftRegister";
import { gpsL5I } from "@/lib/gnss/signals/gpsL5I";
import { worstDopplerPair, worstPair } from "@/lib/gnss/worstPair";
import gold from "@/tests/reference/ca-correlations.json";
import reference from "@/tests/reference/code-correlations.json";
import { expectNear } from "@/tests/support/expectNear";

const CODES = Array.from({ length: 32 }, (_, n) => caCode(n + 1));
const MS = 0.001;

describe("correlationLevels", () => {
  test("C/A sidelobes take three levels, counted as a second program has them", () => {
    for (const [prn, counts] of gold.auto.rows as unknown as [number, Record<string, number>][]) {
      const sidelobes = exactCorrelation(caCode(prn), caCode(prn)).periodic.subarray(1);
      const expected = Object.entries(counts).map(([level, count]) => ({ level: Number(level), count }));
      expect(correlationLevels(sidelobes)).toEqual(expected.sort((a, b) => a.level - b.level));
      expect(correlationLevels(sidelobes).map(({ level }) => level)).toEqual(reference.worst.levels);
    }
  });

  test("nothing has no levels", () => expect(correlationLevels([])).toEqual([]));
});

describe("the worst of the 496 pairs of C/A codes", () => {
  test("without Doppler and data: the Gold bound", () => {
    const found = worstPair(CODES, "periodic");
    expect(found.magnitude).toBe(65);
    expectNear(found.isolationDb, reference.worst.bound_db, 5.1e-4, "isolation, dB");
    expect(Math.abs(exactCorrelation(CODES[found.a], CODES[found.b]).periodic[found.lagChips])).toBe(65);
  });

  test("with a data flip", () => {
    const found = worstPair(CODES, "flipped");
    expect(found.magnitude).toBe(reference.worst.flipped.max_abs_over_496_pairs);
    expectNear(found.isolationDb, reference.worst.flipped.isolation_db, 5.1e-4, "isolation, dB");
    expect(worstPair(CODES.slice(0, 5), "either").magnitude).toBe(worstPair(CODES.slice(0, 5), "flipped").magnitude);
  });

  test.each(gold.dopplerWorst.rows.slice(0, 3).map((row) => row as number[]))(
    "%i kHz apart: %d chips, %d dB down",
    (kHz, magnitude, isolationDb, prnA, prnB, lag) => {
      const found = worstDopplerPair(CODES, kHz * 1000, 1.023e6);
      expectNear(found.magnitude, magnitude, 5.1e-4, "chips");
      expectNear(found.isolationDb, isolationDb, 5.1e-4, "isolation, dB");
      // Several pairs reach it, equal but for rounding; the second program's is one of them.
      const there = dopplerCorrelation(caCode(prnA), caCode(prnB), kHz * 1000, MS)[lag];
      expectNear(there, found.magnitude, 1e-9, "chips at the second program's place");
    },
  );

  test.each(reference.crossDopplerShare.rows.slice(0, 2).map((row) => row as number[]))(
    "%i kHz apart: how many lags lie how high",
    (kHz, ...shares) => {
      const counts = [0, 0, 0];
      let [lags, top] = [0, 0];
      dopplerPairs(CODES, kHz * 1000, 1.023e6, (_a, _b, magnitudes) => {
        for (const magnitude of magnitudes) {
          const levelDb = 20 * Math.log10(magnitude / 1023);
          [-24.5, -23.5, -22].forEach((limit, n) => (counts[n] += levelDb >= limit ? 1 : 0));
          top = Math.max(top, levelDb === -Infinity ? top : magnitude);
          lags++;
        }
      });
      expect(lags).toBe(496 * 1023);
      // Printed to five figures.
      counts.forEach((count, n) => expectNear(count / lags, shares[n], 6e-6, `share ${n}`));
      expectNear(20 * Math.log10(top / 1023), shares[3], 5.1e-4, "highest, dB");
    },
  );

  test("refuses fewer than two codes and unequal lengths", () => {
    expect(() => worstPair([caCode(1)], "periodic")).toThrow(RangeError);
    expect(() => worstDopplerPair([], 0, 1.023e6)).toThrow(RangeError);
    expect(() => worstDopplerPair([caCode(1), new Int8Array(5)], 0, 1.023e6)).toThrow(RangeError);
  });
});

test.each(reference.autoDoppler.rows.map((row) => row as number[]))(
  "a C/A code with itself, %i kHz apart: %d chips, %d dB down at PRN %i, lag %i",
  (kHz, magnitude, isolationDb, prn, lag) => {
    const values = dopplerCorrelation(caCode(prn), caCode(prn), kHz * 1000, MS);
    expectNear(values[lag], magnitude, 5.1e-4, "chips");
    expectNear(20 * Math.log10(1023 / values[lag]), isolationDb, 5.1e-4, "isolation, dB");
  },
);

describe("dopplerPairs", () => {
  test("agrees pair by pair with dopplerCorrelation, between whole kHz too", () => {
    const codes = [3, 8, 21].map((prn) => caCode(prn));
    const seen: [number, number][] = [];
    dopplerPairs(codes, -1730.5, 1.023e6, (a, b, magnitudes) => {
      seen.push([a, b]);
      const single = dopplerCorrelation(codes[a], codes[b], -1730.5, MS);
      magnitudes.forEach((value, k) => expectNear(value, single[k], 1e-8, `lag ${k}`));
    });
    expect(seen).toEqual([
      [0, 1],
      [0, 2],
      [1, 2],
    ]);
  });

  test("serves other chip rates: L5 by direct summation", () => {
    const codes = [1, 3].map((prn) => chipsOf(gpsL5I.code(prn)));
    dopplerPairs(codes, 1250, 10.23e6, (_a, _b, magnitudes) => {
      const single = dopplerCorrelation(codes[0], codes[1], 1250, MS, 10.23e6);
      for (const k of [0, 1, 5000]) {
        let [re, im] = [0, 0];
        for (let n = 0; n < 10_230; n++) {
          const product = codes[0][n] * codes[1][(n + k) % 10_230];
          re += product * Math.cos((2 * Math.PI * 1250 * n) / 10.23e6);
          im += product * Math.sin((2 * Math.PI * 1250 * n) / 10.23e6);
        }
        expectNear(magnitudes[k], Math.hypot(re, im), 1e-7, `pairs, lag ${k}`);
        expectNear(single[k], Math.hypot(re, im), 1e-7, `single, lag ${k}`);
      }
    });
  });
});
