import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import {
  CODE_NAMES,
  isCodeName,
  isSignalName,
  loadCodes,
  loadSignal,
  SIGNAL_NAMES,
  type CodeName,
} from "@/lib/gnss/signals/registry";
import second from "@/tests/reference/signal-codes.json";
import { bitsOf, octalOf } from "./bits";

type Row = [number, number, string, string, number, number, string];
const rowsOf = (name: CodeName) => second.signals[name] as Row[];

describe.each(CODE_NAMES)("%s", (name) => {
  test("is, chip for chip, the code of a second program", async () => {
    const table = await loadCodes(name);
    expect(rowsOf(name).length).toBeGreaterThan(30);
    for (const [prn, length, first, last, ones, zeros, sha256] of rowsOf(name)) {
      const bits = bitsOf(table.code(prn));
      const found = [bits.length, octalOf(bits.slice(0, 24)), octalOf(bits.slice(-24))];
      expect([prn, ...found]).toEqual([prn, length, first, last]);
      const sum = bits.split("1").length - 1;
      expect([prn, sum, length - sum]).toEqual([prn, ones, zeros]);
      expect([prn, createHash("sha256").update(bits).digest("hex")]).toEqual([prn, sha256]);
    }
  });

  test("numbers its satellites once, ascending, and every one has a code of its own array", async () => {
    const { prns, code, lengthChips } = await loadCodes(name);
    expect(prns).toEqual([...new Set(prns)].sort((a, b) => a - b));
    const changed = code(prns[0]);
    expect(changed).toHaveLength(lengthChips);
    changed.fill(7);
    expect(code(prns[0])).not.toContain(7);
  });

  test("refuses numbers without a published code", async () => {
    const { prns, code } = await loadCodes(name);
    for (const prn of [0, -1, 1.5, NaN, 64, 119, 159, 207, 1000].filter((one) => !prns.includes(one)))
      expect(() => code(prn), String(prn)).toThrow(RangeError);
  });
});

test("there is a table for every code that the second program made, and no other", () => {
  expect([...CODE_NAMES].sort()).toEqual(Object.keys(second.signals).sort());
});

test("names are told from what an object brings along", () => {
  expect([isSignalName("GPS_L1CA"), isSignalName("GPS_L1CO"), isCodeName("GPS_L1CO")]).toEqual([true, false, true]);
  for (const name of ["gps_l1ca", "toString", "__proto__", "constructor", ""])
    expect([isSignalName(name), isCodeName(name)]).toEqual([false, false]);
});

// Carriers, chip rates and lengths in time: interface documents, compared in two public lists.
test.each([
  ["GPS_L1CA", 1575.42e6, 1.023e6, 1],
  ["GPS_L1CD", 1575.42e6, 1.023e6, 10],
  ["GPS_L1CP", 1575.42e6, 1.023e6, 10],
  ["GPS_L2CM", 1227.6e6, 0.5115e6, 20],
  ["GPS_L2CL", 1227.6e6, 0.5115e6, 1500],
  ["GPS_L5I", 1176.45e6, 10.23e6, 1],
  ["GPS_L5Q", 1176.45e6, 10.23e6, 1],
  ["GAL_E1B", 1575.42e6, 1.023e6, 4],
  ["GAL_E1C", 1575.42e6, 1.023e6, 4],
  ["GAL_E5aI", 1176.45e6, 10.23e6, 1],
  ["GAL_E5aQ", 1176.45e6, 10.23e6, 1],
  ["GAL_E5bI", 1207.14e6, 10.23e6, 1],
  ["GAL_E5bQ", 1207.14e6, 10.23e6, 1],
] as const)("%s: carrier %d Hz, %d chips/s, one period in %d ms", async (name, carrierHz, chipRateHz, periodMs) => {
  const signal = await loadSignal(name);
  expect([signal.carrierHz, signal.chipRateHz]).toEqual([carrierHz, chipRateHz]);
  expect((1000 * signal.lengthChips) / chipRateHz).toBe(periodMs);
  expect(SIGNAL_NAMES).toContain(name);
});
