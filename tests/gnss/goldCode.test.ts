import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { goldBound, goldCode } from "@/lib/gnss/goldCode";
import { chipsOf, registerSequence, type Chips } from "@/lib/gnss/shiftRegister";
import reference from "@/tests/reference/gold-families.json";

const logic = (chips: Chips) => [...chips].map((chip) => (chip === 1 ? "0" : "1")).join("");
const sha256 = (text: string) => createHash("sha256").update(text).digest("hex");
const countOf = (values: Iterable<number>) => {
  const counts: Record<string, number> = {};
  for (const value of values) counts[value] = (counts[value] ?? 0) + 1;
  return counts;
};
const families = reference.families.map((family) => ({
  ...family,
  polynomials: family.pair_octal.map((text) => Number.parseInt(text, 8)),
}));

describe.each(families)("pair $pair_octal of length $N", (family) => {
  const [first, second] = family.polynomials;
  const [a, b] = [chipsOf(registerSequence(first)), chipsOf(registerSequence(second))];

  test("both sequences are those of a second program", () => {
    expect(a).toHaveLength(family.N);
    expect(logic(a).startsWith(family.first_chips_a)).toBe(true);
    expect(logic(b).startsWith(family.first_chips_b)).toBe(true);
    expect([sha256(logic(a)), sha256(logic(b))]).toEqual([family.sha256_a, family.sha256_b]);
  });

  test("both are of maximal length: two-valued autocorrelation", () => {
    for (const code of [a, b])
      expect(countOf(circularCorrelation(code, code))).toEqual({ [family.N]: 1, "-1": family.N - 1 });
  });

  test("the products are those of a second program", () => {
    expect(sha256(logic(goldCode(first, second, 0)))).toBe(family.sha256_a_xor_b);
    expect(sha256(logic(goldCode(first, second, 5)))).toBe(family.sha256_a_xor_b_left5);
  });

  // Gold (1967): -1, -t, t - 2.
  test("they correlate at three values, with the counted frequencies", () => {
    const t = family["t(n)"];
    const counts = countOf(circularCorrelation(a, b));
    expect(counts).toEqual(family.cross_counts);
    expect(
      Object.keys(counts)
        .map(Number)
        .sort((x, y) => x - y),
    ).toEqual([-t, -1, t - 2]);
  });

  test("the bound is the published one", () => expect(goldBound(family.n)).toBe(family["t(n)"]));

  test("so does the rest of the family", () => {
    const t = family["t(n)"];
    const [one, other] = [goldCode(first, second, 1), goldCode(first, second, Math.floor(family.N / 2))];
    for (const value of circularCorrelation(one, other)) expect([-t, -1, t - 2]).toContain(value);
  });
});

test("the 31-chip pair meets at 7, -1 and -9", () => {
  const values = new Set(circularCorrelation(chipsOf(registerSequence(0o45)), chipsOf(registerSequence(0o75))));
  expect([...values].sort((x, y) => y - x)).toEqual([7, -1, -9]);
});

test("a pair that is not preferred goes beyond three values", () => {
  // 0o45 and 0o51 are reciprocal polynomials of degree 5.
  const values = new Set(circularCorrelation(chipsOf(registerSequence(0o45)), chipsOf(registerSequence(0o51))));
  expect(values.size).toBeGreaterThan(3);
});

test("refuses polynomials without both end terms, unequal lengths and shifts outside", () => {
  expect(() => registerSequence(0o44)).toThrow(RangeError);
  expect(() => registerSequence(1)).toThrow(RangeError);
  expect(() => registerSequence(NaN)).toThrow(RangeError);
  expect(() => goldCode(0o45, 0o103, 0)).toThrow(RangeError);
  for (const shift of [-1, 31, 0.5]) expect(() => goldCode(0o45, 0o75, shift)).toThrow(RangeError);
});

test.each([2, 4, 8, 31, 5.5, NaN])("there is no bound for %d stages", (stages) =>
  expect(() => goldBound(stages)).toThrow(RangeError),
);
