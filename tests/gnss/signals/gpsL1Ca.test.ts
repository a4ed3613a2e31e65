import { expect, test } from "vitest";
import { CA_G2_DELAYS } from "@/lib/gnss/caDelays";
import { caCode } from "@/lib/gnss/caCode";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import published from "@/tests/reference/gps-l1-ca-more.json";
import { bitsOf, octalOf } from "./bits";

const rows = published.rows as [number, number, string][];

// IS-GPS-200, Tables 3-Ib and 6-I: the first of the four octal digits is one chip, the others three each.
test("satellites beyond PRN 37 start with the published ten chips at the published delay", () => {
  for (const [prn, delay, firstTen] of rows) {
    const bits = bitsOf(gpsL1Ca.code(prn)).slice(0, 10);
    expect([prn, CA_G2_DELAYS.get(prn), bits[0] + octalOf(bits.slice(1))]).toEqual([prn, delay, firstTen]);
  }
  expect([...CA_G2_DELAYS.keys()]).toEqual(rows.map(([prn]) => prn));
});

test("its levels are the chips of caCode, 1 for -1", () => {
  for (const prn of [1, 37, 63, 120, 206])
    expect(gpsL1Ca.code(prn)).toEqual(Uint8Array.from(caCode(prn), (chip) => (chip === 1 ? 0 : 1)));
});
