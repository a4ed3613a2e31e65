import { describe, expect, test } from "vitest";
import type { AskedQuantity } from "@/lib/checks/askedQuantities";
import { markNumber } from "@/lib/checks/markNumber";
import { expectNear } from "@/tests/support/expectNear";

const quantity: AskedQuantity = {
  id: "doppler",
  label: "Doppler",
  unit: "Hz",
  choices: [],
  tolerance: 125,
  critical: true,
  reason: "",
};
const mark = (typed: string, computed = -2194, tolerance = 125) =>
  markNumber({ quantity, subject: "PRN 19", typed, computed, unit: "Hz", decimals: 0, tolerance });

test("keeps the text as typed and says what was understood", () =>
  expect(mark(" -2.25 kHz ")).toEqual({
    quantity: "doppler",
    subject: "PRN 19",
    label: "Doppler",
    handedIn: " -2.25 kHz ",
    understood: "\u22122\u2009250\u00a0Hz",
    computed: "\u22122\u2009194\u00a0Hz",
    difference: "\u221256\u00a0Hz",
    tolerance: "±125\u00a0Hz",
    offByTolerances: -56 / 125,
    within: true,
    critical: true,
    errorClass: null,
    reason: null,
  }));

describe("within is off <= tolerance", () => {
  test.each([
    ["-2069", true],
    ["-2068", false],
    ["-2319", true],
    ["-2320", false],
  ])("%s", (typed, within) => expect(mark(typed).within).toBe(within));

  test("no tolerance, nothing within: not a number is outside", () =>
    expect(mark("-2194", -2194, NaN).within).toBe(false));
  test("no computed value, nothing within", () => expect(mark("-2194", NaN).within).toBe(false));
});

test("the gauge goes to the side of the error", () => {
  expectNear(mark("-2694").offByTolerances ?? NaN, -4, 1e-12, "below");
  expectNear(mark("-1694").offByTolerances ?? NaN, 4, 1e-12, "above");
});

test("an outside value has a sentence", () =>
  expect(mark("-1694")).toMatchObject({
    within: false,
    reason: "Your value is 500\u00a0Hz above the computed one; 125\u00a0Hz is allowed.",
  }));

test.each([
  ["", "Nothing was handed in."],
  ["  ", "Nothing was handed in."],
  ["NaN", "“NaN” is not a number."],
  ["1,750", "Is the comma in 1,750 a decimal mark or does it part the thousands? Write 1.750 or 1750."],
  ["5 chip", "chip does not fit. This quantity is in Hz."],
])("%j is outside with a sentence and without a gauge", (typed, reason) =>
  expect(mark(typed)).toMatchObject({
    within: false,
    understood: null,
    difference: null,
    offByTolerances: null,
    reason,
  }),
);
