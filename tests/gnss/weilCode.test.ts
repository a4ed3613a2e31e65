import { expect, test } from "vitest";
import { circularCorrelation } from "@/lib/gnss/correlation";
import { legendreSequence, weilCode, weilSequence } from "@/lib/gnss/weilCode";

// Squares modulo 7 are 1, 2 and 4, modulo 11 they are 1, 3, 4, 5 and 9 (any table of quadratic residues).
test.each([
  [7, "0110100"],
  [11, "01011100010"],
])("the Legendre sequence of length %i marks the squares", (prime, levels) =>
  expect(legendreSequence(prime).join("")).toBe(levels),
);

test("a Weil sequence is the Legendre sequence plus itself shifted", () => {
  // 0110100 and itself two places on, 1010001: 1100101.
  expect(weilSequence(7, 2).join("")).toBe("1100101");
  expect([...weilCode(7, 2)]).toEqual([-1, -1, 1, 1, -1, 1, -1]);
});

// Rushanan, "Weil sequences", 2006 (from memory).
test.each([23, 43, 61])("all members of length %i correlate within 2 sqrt(N) + 5", (prime) => {
  const family = Array.from({ length: (prime - 1) / 2 }, (_, n) => weilCode(prime, n + 1));
  let worst = 0;
  family.forEach((a, i) =>
    family.slice(i).forEach((b, j) => {
      const values = circularCorrelation(a, b);
      if (j === 0) values[0] = 0;
      worst = Math.max(worst, ...values.map(Math.abs));
    }),
  );
  expect(worst).toBeGreaterThan(Math.sqrt(prime));
  expect(worst).toBeLessThanOrEqual(2 * Math.sqrt(prime) + 5);
});

test.each([1, 2, 9, 15, 10_229, 65_537, 7.5, NaN])("length %d is no odd prime up to 65521", (length) =>
  expect(() => legendreSequence(length)).toThrow(RangeError),
);

test.each([0, 4, 1.5, NaN])("index %d lies outside the family of length 7", (index) =>
  expect(() => weilSequence(7, index)).toThrow(RangeError),
);
