import { describe, expect, test } from "vitest";
import { galileoE1B } from "@/lib/gnss/signals/galileoE1B";
import { galileoE1C } from "@/lib/gnss/signals/galileoE1C";
import { galileoE5aI } from "@/lib/gnss/signals/galileoE5aI";
import { galileoE5aQ } from "@/lib/gnss/signals/galileoE5aQ";
import { galileoE5bI } from "@/lib/gnss/signals/galileoE5bI";
import { galileoE5bQ } from "@/lib/gnss/signals/galileoE5bQ";
import { gpsL1cD } from "@/lib/gnss/signals/gpsL1cD";
import { gpsL1cO } from "@/lib/gnss/signals/gpsL1cO";
import { gpsL1cP } from "@/lib/gnss/signals/gpsL1cP";
import { gpsL2cCode } from "@/lib/gnss/signals/gpsL2cCode";
import { gpsL2cL } from "@/lib/gnss/signals/gpsL2cL";
import { gpsL2cM } from "@/lib/gnss/signals/gpsL2cM";
import { gpsL5I } from "@/lib/gnss/signals/gpsL5I";
import { gpsL5Q } from "@/lib/gnss/signals/gpsL5Q";
import e5 from "@/tests/reference/galileo-e5.json";
import l1c from "@/tests/reference/gps-l1c.json";
import l2c from "@/tests/reference/gps-l2c.json";
import l5 from "@/tests/reference/gps-l5.json";
import { bitsOf, octalOf } from "./bits";

const hexOf = (bits: string) => bits.replace(/.{4}/g, (four) => Number.parseInt(four, 2).toString(16).toUpperCase());

// IS-GPS-800, Tables 3.2-2 and 3.2-3 print both ends of each code.
describe.each([
  ["L1C pilot", gpsL1cP, 1],
  ["L1C data", gpsL1cD, 3],
] as const)("%s", (_name, signal, column) =>
  test("begins and ends with the printed 24 chips", () => {
    for (const row of l1c.rows) {
      const bits = bitsOf(signal.code(row[0] as number));
      const ends = [octalOf(bits.slice(0, 24)), octalOf(bits.slice(-24))];
      expect([row[0], ...ends]).toEqual([row[0], row[column], row[column + 1]]);
    }
  }),
);

test("the L1C overlay begins and ends with the printed eleven bits", () => {
  for (const row of l1c.rows) {
    const bits = bitsOf(gpsL1cO.code(row[0] as number));
    // Four octal digits for eleven bits: the first digit has two.
    const ends = [octalOf(`0${bits.slice(0, 11)}`), octalOf(`0${bits.slice(-11)}`)];
    expect([row[0], ...ends]).toEqual([row[0], row[5], row[6]]);
  }
  expect(gpsL1cP.secondary?.levels(7)).toEqual(gpsL1cO.code(7));
});

// IS-GPS-200, Tables 3-IIa and 3-IIb print the content of the register that gives the last chip of the period. 27 chips
// on from there tell every stage.
describe.each([
  ["L2 CM", gpsL2cM, 1],
  ["L2 CL", gpsL2cL, 2],
] as const)("%s", (_name, signal, column) =>
  test("ends at the printed content of the register", () => {
    for (const row of l2c.rows) {
      const code = signal.code(row[0] as number);
      const runOn = gpsL2cCode(startOf(code.subarray(0, 27)), code.length + 26);
      expect(Buffer.compare(runOn.subarray(0, code.length), code)).toBe(0);
      const printed = Number.parseInt(row[column] as string, 8);
      expect([row[0], bitsOf(runOn.subarray(-27))]).toEqual([row[0], bitsOf(gpsL2cCode(printed, 27))]);
    }
  }),
);

/** The start that puts out these 27 levels: output n is stage n + 1 of the start, turned by what the lower ones fed back. */
function startOf(first: Uint8Array): number {
  let start = 0;
  for (let n = 0; n < 27; n++) if (gpsL2cCode(start, n + 1)[n] !== first[n]) start += 2 ** n;
  return start;
}

// IS-GPS-705 prints the XB register at the start, stage 1 to 13; stage 13 comes out first, and XA starts with 13 ones.
describe.each([
  ["L5 I5", gpsL5I, 1],
  ["L5 Q5", gpsL5Q, 2],
] as const)("%s", (_name, signal, column) =>
  test("starts from the printed content of XB", () => {
    for (const row of l5.rows) {
      const first = [...signal.code(row[0] as number).subarray(0, 13)];
      const xb = first.map((level) => level ^ 1).reverse();
      expect([row[0], xb.join("")]).toEqual([row[0], row[column]]);
    }
  }),
);

// Galileo OS SIS ICD, issue 2, Tables 17 to 20.
test.each([
  ["E5a-I", galileoE5aI, 1],
  ["E5a-Q", galileoE5aQ, 2],
  ["E5b-I", galileoE5bI, 3],
  ["E5b-Q", galileoE5bQ, 4],
] as const)("%s starts with the printed 24 chips", (_name, signal, column) => {
  for (const row of e5.rows) {
    const first = hexOf(bitsOf(signal.code(row[0] as number)).slice(0, 24));
    expect([row[0], first]).toEqual([row[0], row[column]]);
  }
});

// The same document, Annex C: E1-B 1 begins F5D710130573, E1-C 1 begins B39340CA1C81 (from memory, and in the data).
test("E1 codes start as printed in hexadecimal", () => {
  expect(hexOf(bitsOf(galileoE1B.code(1)).slice(0, 48))).toBe("F5D710130573");
  expect(hexOf(bitsOf(galileoE1C.code(1)).slice(0, 48))).toBe("B39340CA1C81");
});

// Lengths and numbers of the second codes: Galileo OS SIS ICD, issue 2, 3.5 and 3.6; Neuman-Hofman codes: IS-GPS-705.
test("second codes are as long as printed, and pilots of E5 have one of their own each", () => {
  const text = (signal: { secondary: typeof galileoE5aQ.secondary }, prn: number) =>
    bitsOf(signal.secondary!.levels(prn));
  expect([text(gpsL5I, 1), text(gpsL5Q, 1)]).toEqual(["0000110101", "00000100110101001110"]);
  expect([text(galileoE5bI, 9), text(galileoE5aI, 9)]).toEqual(["1110", "10000100001011101001"]);
  expect(text(galileoE1C, 9)).toBe("0011100000001010110110010");
  const pilots = galileoE5aQ.prns.flatMap((prn) => [text(galileoE5aQ, prn), text(galileoE5bQ, prn)]);
  expect(new Set(pilots).size).toBe(100);
  expect(pilots.every((one) => one.length === 100)).toBe(true);
  expect(hexOf(text(galileoE5aQ, 1))).toBe("83F6F69D8F6E15411FB8C9B1C");
});
