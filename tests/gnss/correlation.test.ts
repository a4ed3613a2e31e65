import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { dopplerCorrelation } from "@/lib/gnss/crossCorrelation";
import { randomCodeDeviation } from "@/lib/gnss/randomCodeDeviation";
import { seededRandom } from "@/lib/numeric/random";
import reference from "@/tests/reference/ca-correlations.json";
import { formulaCases } from "@/tests/reference/formulaCases";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

type Counts = Record<string, number>;
const countOf = (values: Iterable<number>) => {
  const counts: Counts = {};
  for (const value of values) counts[value] = (counts[value] ?? 0) + 1;
  return counts;
};
const MS = 0.001;

describe("circularCorrelation", () => {
  test.each(reference.auto.rows.map((row) => row as unknown as [number, Counts]))(
    "PRN %i with itself: 1023, and sidelobes counted as published",
    (prn, sidelobes) => {
      const values = circularCorrelation(caCode(prn), caCode(prn));
      expect(values[0]).toBe(1023);
      expect(countOf(values.slice(1))).toEqual(sidelobes);
    },
  );

  test.each(reference.cross.rows.map((row) => row as unknown as [number, number, Counts, number, number, number]))(
    "PRN %i with %i: -65, -1, 63 counted as published, at the published lags",
    (a, b, counts, ...lags) => {
      const values = circularCorrelation(caCode(a), caCode(b));
      expect(countOf(values)).toEqual(counts);
      expect([values[0], values[1], values[100]]).toEqual(lags);
    },
  );

  test("reversing the roles reverses the lags", () => {
    const [ab, ba] = [circularCorrelation(caCode(3), caCode(9)), circularCorrelation(caCode(9), caCode(3))];
    for (let k = 0; k < 1023; k++) expect(ab[k]).toBe(ba[(1023 - k) % 1023]);
  });

  test("shifting a code moves its peak to that lag", () => {
    const code = caCode(11);
    const later = code.map((_, n) => code[(n + 1023 - 5) % 1023]); // delayed by five chips
    const values = circularCorrelation(code, later);
    expect(values.indexOf(1023)).toBe(5);
  });

  test("all lags together give the product of the sums, for any codes", () => {
    const chips = fc.array(fc.constantFrom(-1, 1), { minLength: 1, maxLength: 40 });
    fc.assert(
      fc.property(chips, chips, (first, second) => {
        const length = Math.min(first.length, second.length);
        const [a, b] = [Int8Array.from(first.slice(0, length)), Int8Array.from(second.slice(0, length))];
        const sum = (values: Iterable<number>) => [...values].reduce((total, value) => total + value, 0);
        expectNear(sum(circularCorrelation(a, b)), sum(a) * sum(b), 0, "sum over the lags");
      }),
      { seed: 1, numRuns: 50 },
    );
  });

  test("refuses unequal or missing codes", () => {
    expect(() => circularCorrelation(new Int8Array(3), new Int8Array(4))).toThrow(RangeError);
    expect(() => circularCorrelation(new Int8Array(0), new Int8Array(0))).toThrow(RangeError);
  });
});

describe("dopplerCorrelation", () => {
  test("without Doppler it is the magnitude of the whole-number correlation", () => {
    const exact = circularCorrelation(caCode(5), caCode(4));
    dopplerCorrelation(caCode(5), caCode(4), 0, 10 * MS).forEach((value, k) =>
      expectNear(value, Math.abs(exact[k]), 1e-9, `lag ${k}`),
    );
  });

  test.each(reference.dopplerPairs.rows.map((row) => row as unknown as [number, number, number[]]))(
    "PRN %i and %i: largest values at 0 to 9 kHz as published",
    (a, b, largest) =>
      largest.forEach((value, kHz) =>
        // printed to 0.001 chip
        expectNear(Math.max(...dopplerCorrelation(caCode(a), caCode(b), kHz * 1000, MS)), value, 5.1e-4, `${kHz} kHz`),
      ),
  );

  test.each(reference.dopplerWorst.rows.map((row) => row as [number, number, number, number, number, number]))(
    "at %i kHz the worst pair of PRN 1-32 reaches %d chips, %d dB down",
    (kHz, largest, isolationDb, a, b, lag) => {
      const value = dopplerCorrelation(caCode(a), caCode(b), kHz * 1000, MS)[lag];
      expectNear(value, largest, 5.1e-4, "chips");
      expectNear(20 * Math.log10(1023 / value), isolationDb, 5.1e-4, "isolation");
    },
  );

  test("agrees with direct summation, sign of the Doppler included", () => {
    const [a, b] = [caCode(7), caCode(21)];
    for (const dopplerHz of [1730, -4250.5]) {
      const values = dopplerCorrelation(a, b, dopplerHz, MS);
      for (const k of [0, 1, 500, 1022]) {
        let [re, im] = [0, 0];
        for (let n = 0; n < 1023; n++) {
          const angle = (2 * Math.PI * dopplerHz * n) / 1.023e6;
          re += a[n] * b[(n + k) % 1023] * Math.cos(angle);
          im += a[n] * b[(n + k) % 1023] * Math.sin(angle);
        }
        expectNear(values[k], Math.hypot(re, im), 1e-9, `${dopplerHz} Hz, lag ${k}`);
      }
    }
  });

  test("a longer coherent sum keeps whole kHz and takes out what lies between", () => {
    const [a, b] = [caCode(1), caCode(11)];
    const one = dopplerCorrelation(a, b, 1000, MS);
    dopplerCorrelation(a, b, 1000, 10 * MS).forEach((value, k) => expectNear(value, one[k], 1e-8, `lag ${k}`));
    expectNear(Math.max(...dopplerCorrelation(a, b, 500, 10 * MS)), 0, 1e-8, "half a kHz off over 10 ms");
    // A code against itself, 50 Hz off over 10 ms: sin(x)/x at pi/2.
    expectNear(dopplerCorrelation(a, a, 50, 10 * MS)[0] / 1023, 2 / Math.PI, 1e-3, "half a turn");
  });

  test.each([0.5 * MS, 0, 1.5 * MS, NaN])("refuses a coherent time of %d s", (coherentS) =>
    expect(() => dopplerCorrelation(caCode(1), caCode(2), 0, coherentS)).toThrow(RangeError),
  );
});

test.each(formulaCases("S10"))("$name", ({ given, expected }) =>
  expectNearRelative(20 * Math.log10(1023 / given.max), expected.dB, 2e-5, "isolation"),
);

test("zero Doppler leaves 23.94 dB between two codes, whole kHz at worst 21.08 dB", () => {
  // S10: 65 chips and 90.333 chips of 1023.
  const worst = (dopplerHz: number) => Math.max(...dopplerCorrelation(caCode(1), caCode(11), dopplerHz, MS));
  expectNear(20 * Math.log10(1023 / worst(0)), 23.94, 0.005, "0 kHz");
  expectNear(20 * Math.log10(1023 / worst(1000)), 21.08, 0.005, "1 kHz");
});

test("random codes scatter by 1/sqrt N of the full peak", () => {
  const random = seededRandom("5a".repeat(32), "random codes");
  const chips = () => Int8Array.from({ length: 1023 }, () => (random.uniform() < 0.5 ? -1 : 1));
  let squares = 0;
  for (let n = 0; n < 4; n++) for (const value of circularCorrelation(chips(), chips())) squares += value * value;
  const deviation = Math.sqrt(squares / (4 * 1023)) / 1023;
  expectNearRelative(deviation, randomCodeDeviation(1023), 0.05, "deviation over 4092 lags");
  expect(() => randomCodeDeviation(0)).toThrow(RangeError);
});
