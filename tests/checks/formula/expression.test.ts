import { describe, expect, test } from "vitest";
import { ExpressionFault } from "@/lib/checks/formula/expression";
import { readFormula, type Named } from "@/lib/checks/formula/readFormula";
import type { Unit } from "@/lib/gnss/units";
import { expectNear } from "../../support/expectNear";

const KNOWN: Named[] = [
  { id: "L", unit: "m" },
  { id: "vf", unit: "1" },
  { id: "t", unit: "us" },
  { id: "B", unit: "MHz" },
  { id: "G", unit: "dB" },
  { id: "P", unit: "dBm" },
  { id: "Q", unit: "dBW" },
  { id: "cn0", unit: "dB-Hz" },
  { id: "a", unit: "dB/100m" },
  { id: "el", unit: "deg" },
  { id: "U", unit: "V" },
  { id: "I", unit: "mA" },
  { id: "r", unit: "ohm/km" },
  { id: "s", unit: "sigma" },
];

/** Value of a formula in a unit, its names set in their own units. */
function work(text: string, unit: Unit = "1", values: Record<string, number> = {}): number {
  return readFormula(text, KNOWN, unit).value(new Map(Object.entries(values)));
}

/** The fault of a formula: the character it stands at and what is said. */
function fault(text: string, unit: Unit = "1"): [number, string] {
  try {
    readFormula(text, KNOWN, unit);
  } catch (error) {
    if (error instanceof ExpressionFault) return [error.at, error.message];
    throw error;
  }
  throw new Error(`${text} was read`);
}

describe("numbers by the usual order of operations", () => {
  // Worked by hand.
  test.each([
    ["1 + 2 * 3", 7],
    ["(1 + 2) * 3", 9],
    ["10 - 4 - 3", 3],
    ["64 / 4 / 2", 8],
    ["-2^2", -4],
    ["(-2)^2", 4],
    ["2^3^2", 512],
    ["2^-1", 0.5],
    ["2 * -3", -6],
    ["+5", 5],
    ["1.5e3 + .5", 1500.5],
    ["sqrt(16) + abs(-2)", 6],
    ["min(3, 1, 2) + max(3, 1, 2)", 4],
    ["log10(1000)", 3],
    ["exp(0)", 1],
    ["sin(0) + cos(0)", 1],
    ["10^0.5 * 10^0.5", 10],
  ])("%s is %d", (text, value) => expectNear(work(text), value, 1e-12, text));

  // Abramowitz & Stegun, Handbook of Mathematical Functions (1964), table 1.1: pi, e, and sin 1 of table 4.6.
  test.each([
    ["pi", 3.14159265358979],
    ["exp(1)", 2.71828182845905],
    ["sin(1)", 0.841470984807897],
    ["log10(2)", 0.301029995663981],
  ])("%s is %d", (text, value) => expect(Math.abs(work(text) - value)).toBeLessThan(6e-15));
});

describe("units are carried", () => {
  test("the speed of light by definition: 299 792 458 m in a second", () =>
    expect(work("L / c", "s", { L: 299_792_458 })).toBe(1));
  test("a length over a velocity is a time, in the unit that is asked", () =>
    // 1 m of cable at 0.66 of the speed of light: 3.33564 ns / 0.66, worked by hand
    expectNear(work("L / (vf * c)", "ns", { L: 1, vf: 0.66 }), 5.054, 1e-4, "L / (vf * c)"));
  test("a wavelength: 0.1903 m at 1 575.42 MHz", () =>
    expectNear(work("c / B", "m", { B: 1575.42 }), 0.190294, 1e-6, "c / B"));
  test("time times frequency is a plain number", () =>
    expectNear(work("t * B", "1", { t: 2, B: 3 }), 6, 1e-12, "t * B"));
  test("a square and its root", () => expectNear(work("sqrt(L^2)", "km", { L: 1500 }), 1.5, 1e-12, "sqrt(L^2)"));
  test("ohms by length: 2 ohm/km over 500 m at 100 mA drop 0.1 V", () =>
    expectNear(work("r * L * I", "V", { r: 2, L: 500, I: 100 }), 0.1, 1e-12, "r * L * I"));
  test("an angle into a sine: sin 30 degrees is a half", () =>
    expectNear(work("sin(el)", "1", { el: 30 }), 0.5, 1e-14, "sin(el)"));
  test("and out of an arc: 45 degrees", () =>
    expectNear(work("atan2(L, L)", "deg", { L: 7 }), 45, 1e-12, "atan2(L, L)"));
  test("names that every object inherits are no names", () =>
    expect(fault("constructor + 1")[1]).toMatch(/neither a given/));
});

describe("levels", () => {
  test("loss per length times length is dB", () =>
    expectNear(work("a * L", "dB", { a: 20, L: 50 }), 10, 1e-12, "a * L"));
  test("dBm and dB add up to dBm", () => expectNear(work("P + G", "dBm", { P: -130, G: 30 }), -100, 1e-12, "P + G"));
  test("dBm less dBW is dB", () => expectNear(work("P - Q", "dB", { P: 0, Q: 0 }), -30, 1e-12, "P - Q"));
  test("10 log10 of a plain number is dB", () =>
    expectNear(work("G + 10 * log10(vf)", "dB", { G: 1, vf: 100 }), 21, 1e-12, "G + 10 * log10(vf)"));
  test("10 log10 of a bandwidth is dB-Hz", () =>
    expectNear(work("G + 10 * log10(B)", "dB-Hz", { G: 0, B: 1 }), 60, 1e-12, "G + 10 * log10(B)"));
  test("C/N0 times coherent time: 40 dB-Hz and 1 ms make 10 dB", () =>
    expectNear(work("cn0 + 10 * log10(t)", "dB", { cn0: 40, t: 1000 }), 10, 1e-12, "cn0 + 10 * log10(t)"));
  test("20 log10 of a voltage ratio", () =>
    expectNear(work("20 * log10(U / U)", "dB", { U: 3 }), 0, 1e-12, "20 * log10(U / U)"));
  test("powers add as plain numbers: twice 0 dBm are 3.0103 dBm", () =>
    expectNear(
      work("10 * log10(10^(P/10) + 10^(P/10))", "dBm", { P: 0 }),
      3.0103,
      1e-4,
      "10 * log10(10^(P/10) + 10^(P/10))",
    ));
  test("a power from voltage and current: 5 V and 200 mA are 0 dBW", () =>
    expectNear(work("10 * log10(U * I)", "dBW", { U: 5, I: 200 }), 0, 1e-12, "10 * log10(U * I)"));
  test("a logarithm may stay a plain number: sqrt(-2 ln 1e-6) is 5.2565", () =>
    expectNear(
      work("sqrt(-2 * log10(vf) * 2.302585092994046)", "1", { vf: 1e-6 }),
      5.25652,
      1e-5,
      "sqrt(-2 * log10(vf) * 2.302585092994046)",
    ));
});

describe("a fault stands at its character and says what to write", () => {
  test.each<[string, Unit, number, RegExp]>([
    ["", "1", 0, /ends too early/],
    ["L /", "m", 3, /ends too early/],
    ["2 +* 3", "1", 3, /A value is missing before \*/],
    ["(1 + 2", "1", 0, /not closed/],
    ["1 + 2)", "1", 5, /closes none/],
    ["2 L", "m", 2, /Write \+ - \* \/ or \^ before L/],
    ["2(3)", "1", 1, /before \(/],
    ["0,5 * L", "m", 1, /Write a point/],
    ["L × 2", "m", 2, /Write \* for ×/],
    ["L − 2", "m", 2, /Write - for −/],
    ["L ** 2", "m", 3, /missing before \*/],
    ["vf = 2", "1", 3, /not part of a formula/],
    ["velocity", "1", 0, /neither a given nor an earlier quantity/],
    ["log(2)", "1", 0, /There is no function log\. There are sqrt/],
    ["sqrt", "1", 0, /in brackets/],
    ["sqrt(1, 2)", "1", 0, /takes 1 value/],
    ["min(1)", "1", 0, /2 to 8 values/],
    ["L(2)", "m", 0, /Write L \* \(\.\.\.\)/],
    ["L + t", "m", 2, /A value in s cannot be added to a value in m/],
    ["L + 5", "m", 2, /A plain number cannot be added to a value in m/],
    ["G + 3", "dB", 2, /makes dB of a plain number/],
    ["vf * 2 + G", "1", 7, /A level in dB cannot be added to a plain number/],
    ["G * G", "dB", 2, /not multiplied/],
    ["P * vf", "dBm", 2, /by a written number only/],
    ["P + P", "dBm", 2, /works out to a level that counts/],
    ["L / c", "m", 2, /works out to a value in s, and the quantity is in m/],
    ["vf", "dB", 0, /10 \* log10/],
    ["G", "1", 0, /10\^\(x\/10\)/],
    ["L^vf", "m", 2, /written whole number/],
    ["2^L", "1", 2, /exponent is a plain number/],
    ["exp(L)", "1", 0, /exp does not take a value in m/],
    ["sin(L)", "1", 0, /takes an angle/],
    ["log10(G)", "dB", 0, /logarithm already/],
    ["sqrt(G)", "1", 0, /sqrt does not take a level in dB/],
    ["atan2(L, t)", "deg", 0, /measure the same/],
    ["1e999", "1", 0, /too large/],
  ])("%j in %s at %d", (text, unit, at, says) => {
    const [place, message] = fault(text, unit);
    expect(message).toMatch(says);
    expect(place).toBe(at);
    expect(message).toMatch(/\.$/);
  });
});

describe("bounds", () => {
  test("200 parts, no more", () => {
    const sum = (terms: number) => Array.from({ length: terms }, () => "1").join("+");
    expect(work(sum(100))).toBe(100);
    expect(fault(sum(101))[1]).toMatch(/at most 200 parts/);
  });
  test.each(["(", "-", "sqrt(", "2^"])("a long row of %s is refused, not run out of stack", (part) => {
    expect(fault(part.repeat(900) + "1")[1]).toMatch(/nested at most|not closed|ends too early/);
  });
  test("where there is no value, there is none, and nothing is thrown", () => {
    for (const text of [
      "1 / 0",
      "0 / 0",
      "sqrt(-1)",
      "log10(-1)",
      "log10(0)",
      "(-8)^(1/3)",
      "0^-1",
      "sin(1e9)",
      "exp(1e9)",
      "10^1e9",
    ])
      expect(Number.isFinite(work(text)), text).toBe(false);
    expect(work("vf", "1", {})).toBeNaN();
    expect(Object.is(work("0 * -1"), 0)).toBe(true);
  });
});
