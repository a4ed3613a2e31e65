import { expect, test } from "vitest";
import { parsePrn } from "@/lib/checks/parsePrn";

test.each([
  ["7", 7],
  [" 07 ", 7],
  ["G07", 7],
  ["g32", 32],
  ["PRN 7", 7],
  ["SV 7", 7],
])("%j is PRN %i", (text, prn) => expect(parsePrn(text)).toEqual({ prn }));

test.each([
  ["", "Nothing was handed in."],
  ["0", "GPS satellites have PRN 1 to 32; 0 is none of them."],
  ["33", "GPS satellites have PRN 1 to 32; 33 is none of them."],
  ["E11", "“E11” is not a PRN."],
  ["7.5", "“7.5” is not a PRN."],
  ["-7", "“-7” is not a PRN."],
  ["seven", "“seven” is not a PRN."],
  ["x".repeat(50), `“${"x".repeat(40)}…” is not a PRN.`],
])("%j is refused", (text, problem) => expect(parsePrn(text)).toEqual({ problem }));
