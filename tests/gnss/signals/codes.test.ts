import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import { isSignalName, loadSignal, SIGNAL_NAMES, type SignalName } from "@/lib/gnss/signals/registry";
import second from "@/tests/reference/signal-codes.json";
import { bitsOf, octalOf } from "./bits";

type Row = [number, number, string, string, number, number, string];
const rowsOf = (name: SignalName) => second.signals[name] as Row[];

describe.each(SIGNAL_NAMES)("%s", (name) => {
  test("is, chip for chip, the code of a second program", async () => {
    const signal = await loadSignal(name);
    expect(rowsOf(name).length).toBeGreaterThan(30);
    for (const [prn, length, first, last, ones, zeros, sha256] of rowsOf(name)) {
      const bits = bitsOf(signal.code(prn));
      const found = [bits.length, octalOf(bits.slice(0, 24)), octalOf(bits.slice(-24))];
      expect([prn, ...found]).toEqual([prn, length, first, last]);
      const sum = signal.code(prn).reduce((total, level) => total + level, 0);
      expect([prn, sum, length - sum]).toEqual([prn, ones, zeros]);
      expect([prn, createHash("sha256").update(bits).digest("hex")]).toEqual([prn, sha256]);
    }
  });

  test("numbers its satellites once, ascending, and every one has a code of its own array", async () => {
    const { prns, code, lengthChips } = await loadSignal(name);
    expect(prns).toEqual([...new Set(prns)].sort((a, b) => a - b));
    const changed = code(prns[0]);
    expect(changed).toHaveLength(lengthChips);
    changed.fill(7);
    expect(code(prns[0])).not.toContain(7);
  });

  test("refuses numbers without a published code", async () => {
    const { prns, code } = await loadSignal(name);
    for (const prn of [0, -1, 1.5, NaN, 64, 119, 159, 207, 1000].filter((one) => !prns.includes(one)))
      expect(() => code(prn), String(prn)).toThrow(RangeError);
  });
});

test("names are told from what an object brings along", () => {
  expect(isSignalName("GPS_L1CA")).toBe(true);
  for (const name of ["gps_l1ca", "toString", "__proto__", "constructor", ""]) expect(isSignalName(name)).toBe(false);
});
