import { expect, test } from "vitest";
import { formatDifference } from "@/lib/checks/formatDifference";
import { formatNumber, formatQuantity } from "@/lib/checks/formatQuantity";
import { formatUnderstood } from "@/lib/checks/formatUnderstood";
import type { Unit } from "@/lib/gnss/units";

// U+2212 is the minus sign, U+2009 the thin space, U+00A0 the space that does not break.
test.each<[number, Unit, number, string]>([
  [-1767.4, "Hz", 0, "\u22121\u2009767\u00a0Hz"],
  [1575420000, "Hz", 0, "1\u2009575\u2009420\u2009000\u00a0Hz"],
  [999.5, "Hz", 0, "1\u2009000\u00a0Hz"],
  [412.236, "chip", 2, "412.24\u00a0chip"],
  [1234.5678, "m", 4, "1\u2009234.5678\u00a0m"],
  [403.2, "us", 1, "403.2\u00a0µs"],
  [73.42, "sigma2", 1, "73.4\u00a0σ²"],
  [0.5, "1", 2, "0.50"],
  [-0.001, "dB", 1, "0.0\u00a0dB"],
  [0, "dB", 1, "0.0\u00a0dB"],
])("%d in %s to %i decimals", (value, unit, decimals, text) =>
  expect(formatQuantity(value, unit, decimals)).toBe(text),
);

test("a difference carries its sign unless nothing is left of it", () => {
  expect(formatDifference(17.2, "Hz", 0)).toBe("+17\u00a0Hz");
  expect(formatDifference(-17.2, "Hz", 0)).toBe("\u221217\u00a0Hz");
  expect(formatDifference(0.004, "dB", 1)).toBe("0.0\u00a0dB");
});

test.each<[number, Unit, string]>([
  [-1750, "Hz", "\u22121\u2009750\u00a0Hz"],
  [88.75, "chip", "88.75\u00a0chip"],
  [0.3, "chip", "0.3\u00a0chip"],
  [1 / 3, "chip", "0.333333\u00a0chip"],
  [2.3e-8, "1", "2.3e\u22128"],
  [0.001, "1", "0.001"],
  [0, "1", "0"],
])("what was understood of %d %s keeps its figures", (value, unit, text) =>
  expect(formatUnderstood(value, unit)).toBe(text),
);

test("numbers are grouped from four figures on", () => {
  expect(formatNumber(1023, 0)).toBe("1\u2009023");
  expect(formatNumber(999, 0)).toBe("999");
});
