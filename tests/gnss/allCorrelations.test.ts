import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { allCorrelations } from "@/lib/gnss/allCorrelations";
import { caCode } from "@/lib/gnss/caCode";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { goldCode } from "@/lib/gnss/goldCode";
import { goldCorrelations } from "@/lib/gnss/goldCorrelations";
import { shiftAndAdd } from "@/lib/gnss/shiftAndAdd";
import { chipsOf, registerSequence, type Chips } from "@/lib/gnss/shiftRegister";
import { gpsL1cP } from "@/lib/gnss/signals/gpsL1cP";
import families from "@/tests/reference/gold-families.json";
import published from "@/tests/reference/gps-l1-ca.json";

const directSums = (codes: readonly Chips[]) =>
  Int16Array.from(codes.flatMap((a) => codes.flatMap((b) => [...circularCorrelation(a, b)])));

const setOfCodes = fc
  .tuple(fc.integer({ min: 1, max: 11 }), fc.integer({ min: 2, max: 40 }))
  .chain(([count, length]) => {
    const code = fc.array(fc.constantFrom(-1, 1), { minLength: length, maxLength: length });
    return fc.array(code, { minLength: count, maxLength: count });
  })
  .map((codes) => codes.map((chips) => Int8Array.from(chips)));

describe("allCorrelations", () => {
  test("holds the direct sums of every pair, for sets of any size and length", () => {
    fc.assert(
      fc.property(setOfCodes, (codes) => void expect(allCorrelations(codes)).toEqual(directSums(codes))),
      { seed: 2, numRuns: 150 },
    );
  });

  test.each([1023, 10_230, 16_383])("is exact where every sum is as large as it can be, length %i", (length) => {
    const codes = [1, 1, -1, 1, 1].map((sign) => new Int8Array(length).fill(sign));
    const values = allCorrelations(codes);
    codes.forEach((a, i) =>
      codes.forEach((b, j) => {
        const row = values.subarray((i * 5 + j) * length, (i * 5 + j + 1) * length);
        expect(row.every((value) => value === a[0] * b[0] * length)).toBe(true);
      }),
    );
  });

  test("takes codes of 10,230 chips too", () => {
    const codes = [1, 4, 11].map((prn) => chipsOf(gpsL1cP.code(prn)));
    const row = allCorrelations(codes).subarray(5 * 10_230, 6 * 10_230);
    expect([row[0], row[1], row[10_229]]).toEqual(
      [0, 1, 10_229].map((k) => codes[1].reduce((sum, chip, n) => sum + chip * codes[2][(n + k) % 10_230], 0)),
    );
  });

  test("writes where it is told", () => {
    const codes = [caCode(1), caCode(2)];
    const place = new Int16Array(4 * 1023).fill(99);
    expect(allCorrelations(codes, place)).toBe(place);
    expect(place).toEqual(directSums(codes));
  });

  test("refuses no codes, unequal lengths and codes too long", () => {
    expect(() => allCorrelations([])).toThrow(RangeError);
    expect(() => allCorrelations([new Int8Array(3), new Int8Array(4)])).toThrow(RangeError);
    expect(() => allCorrelations([new Int8Array(16_384)])).toThrow(RangeError);
    expect(() => allCorrelations([caCode(1)], new Int16Array(5))).toThrow(RangeError);
  });
});

describe("goldCorrelations", () => {
  // Gold families of the reference, the C/A registers among them.
  test.each(families.families.map((family) => family.pair_octal.map((octal) => Number.parseInt(octal, 8))))(
    "family of %i and %i: look-ups are the sums",
    (first, second) => {
      const length = registerSequence(first).length;
      const shifts = [0, 1, 5, 5, length - 1, length >> 1];
      const codes = shifts.map((shift) => goldCode(first, second, shift));
      expect(goldCorrelations(first, second, shifts)).toEqual(allCorrelations(codes));
    },
  );

  test("all 32 x 32 C/A pairs are the sums", () => {
    const rows = published.rows.slice(0, 32);
    const shifts = rows.map((row) => 1023 - (row[2] as number)); // a delay of d chips is read 1023 - d chips later
    const codes = rows.map((row) => caCode(row[0] as number));
    const bytes = (values: Int16Array) => new Uint8Array(values.buffer);
    expect(Buffer.compare(bytes(goldCorrelations(0o2011, 0o3515, shifts)), bytes(allCorrelations(codes)))).toBe(0);
  });

  test("refuses unequal degrees, parents that are not of maximal length and shifts outside", () => {
    expect(() => goldCorrelations(0o45, 0o103, [0])).toThrow(RangeError);
    expect(() => goldCorrelations(0o45, 0o77, [0])).toThrow(RangeError); // 1 + x + ... + x^5 divides 1 + x^6
    for (const shift of [-1, 31, 0.5]) expect(() => goldCorrelations(0o45, 0o75, [shift])).toThrow(RangeError);
    expect(() => goldCorrelations(0o45, 0o75, [0], new Int16Array(30))).toThrow(RangeError);
  });
});

test("a maximal-length sequence plus itself shifted is itself shifted", () => {
  for (const polynomial of [0o7, 0o45, 0o2011, 0o3515]) {
    const levels = registerSequence(polynomial);
    const places = shiftAndAdd(polynomial);
    expect(places[0]).toBe(-1);
    for (const k of [1, 2, levels.length - 1])
      expect(levels.map((level, n) => level ^ levels[(n + k) % levels.length])).toEqual(
        levels.map((_, n) => levels[(n + places[k]) % levels.length]),
      );
  }
});
