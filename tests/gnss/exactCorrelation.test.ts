import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { caCode } from "@/lib/gnss/caCode";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { exactCorrelation } from "@/lib/gnss/exactCorrelation";
import { chipsOf, type Chips } from "@/lib/gnss/shiftRegister";
import { loadSignal, type SignalName } from "@/lib/gnss/signals/registry";
import reference from "@/tests/reference/code-correlations.json";

type Row = number[];
const largest = (values: Int32Array) => values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);

/** The sum with the data flip as it is defined, term by term. */
const flippedSum = (a: Chips, b: Chips) =>
  Array.from(a, (_, k) =>
    a.reduce((sum, chip, n) => sum + chip * b[(n + k) % b.length] * (n + k < b.length ? 1 : -1), 0),
  );

const pairOfCodes = fc
  .integer({ min: 2, max: 70 })
  .chain((length) =>
    fc.tuple(...[0, 1].map(() => fc.array(fc.constantFrom(-1, 1), { minLength: length, maxLength: length }))),
  )
  .map((pair) => pair.map((chips) => Int8Array.from(chips)));

describe("exactCorrelation", () => {
  test("is the direct sum, with and without the flip, for any codes of any length", () => {
    fc.assert(
      fc.property(pairOfCodes, ([a, b]) => {
        const { periodic, flipped } = exactCorrelation(a, b);
        expect([...periodic]).toEqual([...circularCorrelation(a, b)]);
        expect([...flipped]).toEqual(flippedSum(a, b));
      }),
      { seed: 1, numRuns: 200 },
    );
  });

  test.each([2, 3, 1023, 4092, 10_230])("is exact where every sum is as large as it can be, length %i", (length) => {
    const ones = new Int8Array(length).fill(1);
    const { periodic, flipped } = exactCorrelation(ones, ones);
    expect(periodic.every((value) => value === length)).toBe(true);
    expect(flipped.every((value, k) => value === length - 2 * k)).toBe(true);
  });

  test.each(reference.flippedCross.rows)("C/A %i with %i across a data flip", (a, b, most, lag, ...rest) => {
    const { flipped } = exactCorrelation(caCode(a), caCode(b));
    const squares = flipped.reduce((sum, value) => sum + value * value, 0);
    const first = flipped.findIndex((value) => Math.abs(value) === most);
    expect([largest(flipped), first, flipped[0], flipped[1], flipped[100], squares]).toEqual([most, lag, ...rest]);
  });

  test.each(reference.flippedAuto.rows)("C/A %i with itself across a data flip", (prn, most, lag, one, two) => {
    const { flipped } = exactCorrelation(caCode(prn), caCode(prn));
    expect(flipped[0]).toBe(1023);
    const first = flipped.findIndex((value, k) => k > 0 && Math.abs(value) === most);
    expect([largest(flipped.subarray(1)), first, flipped[1], flipped[2]]).toEqual([most, lag, one, two]);
  });

  const signals = Object.entries(reference.signals).filter(([name]) => !name.endsWith("Columns"));
  test.each(signals as unknown as [SignalName, { auto: Row[]; cross: Row[] }][])(
    "%s: sidelobes and pairs as a second program has them",
    async (name, { auto, cross }) => {
      const signal = await loadSignal(name);
      const chips = (prn: number) => chipsOf(signal.code(prn));
      for (const [prn, ...expected] of auto) {
        const { periodic, flipped } = exactCorrelation(chips(prn), chips(prn));
        const found = [largest(periodic.subarray(1)), largest(flipped.subarray(1)), periodic[1], periodic[100]];
        expect([prn, ...found]).toEqual([prn, ...expected]);
      }
      for (const [a, b, ...expected] of cross) {
        const { periodic, flipped } = exactCorrelation(chips(a), chips(b));
        expect([a, b, largest(periodic), largest(flipped), periodic[0], periodic[100]]).toEqual([a, b, ...expected]);
      }
    },
  );

  test("GPS L2 CL, 767,250 chips", async () => {
    const { code } = await loadSignal("GPS_L2CL");
    const [one, other] = [1, 17].map((prn) => chipsOf(code(prn)));
    const cross = exactCorrelation(one, other).periodic;
    expect([largest(cross), cross[0], cross[100]]).toEqual(reference.longCode.cross1with17);
  });

  test.each([
    ["NH10_even", "GPS_L5I"],
    ["NH20_even", "GPS_L5Q"],
    ["CS20_even", "GAL_E5aI"],
    ["CS25_even", "GAL_E1C"],
    ["CS4_even", "GAL_E5bI"],
  ] as const)("second code %s of %s", async (name, signal) => {
    const chips = chipsOf((await loadSignal(signal)).secondary!.levels(1));
    expect([...exactCorrelation(chips, chips).periodic]).toEqual(reference.secondary[name]);
  });

  test("refuses unequal lengths and a single chip", () => {
    expect(() => exactCorrelation(new Int8Array(3), new Int8Array(4))).toThrow(RangeError);
    expect(() => exactCorrelation(new Int8Array(1), new Int8Array(1))).toThrow(RangeError);
  });
});
