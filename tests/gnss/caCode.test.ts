import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { CA_G2_STAGES, caCode } from "@/lib/gnss/caCode";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { goldCode } from "@/lib/gnss/goldCode";
import { chipsOf, registerSequence, type Chips } from "@/lib/gnss/shiftRegister";
import digests from "@/tests/reference/ca-code-digests.json";
import published from "@/tests/reference/gps-l1-ca.json";

const logic = (chips: Chips) => [...chips].map((chip) => (chip === 1 ? "0" : "1")).join("");
const sha256 = (text: string) => createHash("sha256").update(text).digest("hex");
const octal = (bits: string) => bits.replace(/.{3}/g, (three) => String(Number.parseInt(three, 2)));
const EVERY_PRN = published.rows.map((row) => row[0] as number);

// IS-GPS-200, Table 3-Ia: the first of the four octal digits is one chip, the others three each.
test.each(published.rows.map(([prn, , , firstTen]) => [prn as number, firstTen as string]))(
  "caCode(%i) starts with the published ten chips, octal %s",
  (prn, firstTen) => {
    const bits = logic(caCode(prn)).slice(0, 10);
    expect(bits[0] + octal(bits.slice(1))).toBe(firstTen);
  },
);

// The same table gives each code a second time, as a delay of the plain G2 sequence.
test.each(published.rows.map(([prn, stages, delay]) => [prn as number, stages as number[], delay as number]))(
  "caCode(%i): stages %j select the published delay of G2, %i chips",
  (prn, stages, delay) => {
    expect(CA_G2_STAGES.get(prn)).toEqual(stages);
    const [g1, g2] = [registerSequence(0o2011), registerSequence(0o3515)];
    const delayed = g1.map((level, n) => level ^ g2[(n + CA_LENGTH_CHIPS - delay) % CA_LENGTH_CHIPS]);
    expect(caCode(prn)).toEqual(chipsOf(delayed));
  },
);

describe.each(digests.rows.map((row) => row as [number, string, string, number, number, string]))(
  "caCode(%i) is, chip for chip, the code of a second program",
  (prn, first, last, ones, zeros, digest) => {
    const bits = logic(caCode(prn));
    test("ends and digest", () => {
      expect([octal(bits.slice(0, 24)), octal(bits.slice(-24)), sha256(bits)]).toEqual([first, last, digest]);
    });
    test("balance", () => expect([bits.split("1").length - 1, bits.split("0").length - 1]).toEqual([ones, zeros]));
  },
);

test("every code has 1023 chips of +1 or -1, all different but the twins 34 and 37", () => {
  for (const prn of EVERY_PRN) {
    expect(caCode(prn)).toHaveLength(1023);
    expect(caCode(prn).every((chip) => chip === 1 || chip === -1)).toBe(true);
  }
  expect(new Set(EVERY_PRN.map((prn) => sha256(logic(caCode(prn))))).size).toBe(36);
  expect(caCode(34)).toEqual(caCode(37));
});

test("the G1 register taken alone is balanced by one chip, as every maximal-length code", () => {
  const ones = registerSequence(0o2011).reduce((sum, level) => sum + level, 0);
  expect(ones).toBe(512);
});

test.each([0, 64, 119, 159, 182, 207, -1, 1.5, NaN])("caCode(%d) is refused: no published code", (prn) =>
  expect(() => caCode(prn)).toThrow(/prn has no published stages/),
);

test("a C/A code is a Gold code: PRN 1 delays G2 by 5 chips, so reads it 1018 chips later", () => {
  expect(goldCode(0o2011, 0o3515, 1018)).toEqual(caCode(1));
});
