import { expect, test } from "vitest";
import { convert, isConvertible, UNITS, type Unit } from "@/lib/gnss/units";
import { expectNearRelative } from "@/tests/support/expectNear";

const ALL = Object.keys(UNITS) as Unit[];

// SI Brochure, 9th edition, Table 7 (prefixes); minute: Table 8. dBm and dBW: 1 W = 1000 mW = 30 dBm.
test.each<[number, Unit, Unit, number]>([
  [977.52, "ns", "us", 0.97752],
  [1.5, "ms", "s", 0.0015],
  [2, "min", "s", 120],
  [0.29305, "km", "m", 293.05],
  [5, "mm", "m", 0.005],
  [1575.42, "MHz", "Hz", 1.57542e9],
  [4.5, "kHz", "Hz", 4500],
  [2.5, "ppm", "1", 2.5e-6],
  [5, "%", "1", 0.05],
  [0.001, "1", "%", 0.1],
  [-158.5, "dBW", "dBm", -128.5],
  [-128.5, "dBm", "dBW", -158.5],
])("%d %s = %s: %d", (value, from, to, expected) =>
  expectNearRelative(convert(value, from, to), expected, 4e-16 * 4, `${from} to ${to}`),
);

test("a value in its own unit stays as it is", () => {
  for (const unit of ALL) expect(convert(0.1, unit, unit)).toBe(0.1);
});

test("there and back is the same value, for every pair of one dimension", () => {
  for (const from of ALL)
    for (const to of ALL.filter((unit) => isConvertible(from, unit)))
      expectNearRelative(convert(convert(7.3, from, to), to, from), 7.3, 1e-14, `${from} to ${to} and back`);
});

test.each<[Unit, Unit]>([
  ["chip", "us"],
  ["chip", "m"],
  ["dB", "dB-Hz"],
  ["dBm", "dB"],
  ["Hz", "s"],
  ["sigma", "sigma2"],
])("%s is not %s", (from, to) => {
  expect(isConvertible(from, to)).toBe(false);
  expect(() => convert(1, from, to)).toThrow(RangeError);
});
