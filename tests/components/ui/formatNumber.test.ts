import { expect, test } from "vitest";
import { clockText } from "@/components/ui/clockText";
import { formatNumber } from "@/components/ui/formatNumber";

// True minus U+2212, thin space U+2009 between thousands (rules of the identity for figures).
test.each([
  [412.5, 2, false, "412.50"],
  [-1750, 0, false, "\u22121\u2009750"],
  [2250, 0, true, "+2\u2009250"],
  [0, 1, true, "0.0"],
  [-0.04, 1, true, "0.0"],
  [1234567.891, 2, false, "1\u2009234\u2009567.89"],
  [999.999, 2, false, "1\u2009000.00"],
  [1023, 0, false, "1\u2009023"],
  [NaN, 2, false, "–"],
  [Infinity, 0, true, "–"],
])("%d with %d decimals, signed %s, reads %j", (value, decimals, signed, text) =>
  expect(formatNumber(value, decimals, signed)).toBe(text),
);

test.each([
  [2440, "40:40"],
  [59, "00:59"],
  [0, "00:00"],
  [-3, "00:00"],
  [3900, "1:05:00"],
])("%d s reads %s", (seconds, text) => expect(clockText(seconds)).toBe(text));
