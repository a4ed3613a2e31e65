import { describe, expect, test } from "vitest";
import fc from "fast-check";
import { formatQuantity } from "@/lib/checks/formatQuantity";
import { parseQuantity } from "@/lib/checks/parseQuantity";
import { convert, type Unit } from "@/lib/gnss/units";
import { expectNear } from "../support/expectNear";

const valueOf = (text: string, unit: Unit) => {
  const reading = parseQuantity(text, unit);
  if ("problem" in reading) throw new Error(`${text}: ${reading.problem}`);
  return reading.value;
};

describe("reads what people type", () => {
  test.each<[string, Unit, number]>([
    ["412.5", "chip", 412.5],
    ["412.5 chip", "chip", 412.5],
    ["412.5chips", "chip", 412.5],
    ["88,75", "chip", 88.75],
    [" 88,5 ", "chip", 88.5],
    ["+0.5", "chip", 0.5],
    [".5", "chip", 0.5],
    ["5.", "chip", 5],
    ["-1750 Hz", "Hz", -1750],
    ["\u22121\u2009750\u00a0Hz", "Hz", -1750],
    ["\u2013 1 750", "Hz", -1750],
    ["1\u202f575\u202f420\u202f000", "Hz", 1_575_420_000],
    ["-1.75 kHz", "Hz", -1750],
    ["-1.75 KHZ", "Hz", -1750],
    ["1575.42 MHz", "Hz", 1_575_420_000],
    ["403.2 us", "us", 403.2],
    ["403.2 \u00b5s", "us", 403.2],
    ["403.2 \u03bcs", "us", 403.2],
    ["403200 ns", "us", 403.2],
    ["0.4032 ms", "us", 403.2],
    ["10 ms", "s", 0.01],
    ["0.12 km", "m", 120],
    ["45 dB-Hz", "dB-Hz", 45],
    ["45 dBHz", "dB-Hz", 45],
    ["45 dB\u00b7Hz", "dB-Hz", 45],
    ["94 %", "%", 94],
    ["0.94", "1", 0.94],
    ["94 %", "1", 0.94],
    ["2.5 ppm", "ppm", 2.5],
    ["73.4 \u03c3\u00b2", "sigma2", 73.4],
    ["73.4 sigma^2", "sigma2", 73.4],
    ["2.3e-8", "1", 2.3e-8],
    ["2.3E\u22128", "1", 2.3e-8],
    ["1x10^-3", "1", 1e-3],
    ["2.5 \u00d7 10^\u22123", "1", 2.5e-3],
    ["10^-3", "1", 1e-3],
    ["-10^3 Hz", "Hz", -1000],
    ["0.0", "Hz", 0],
  ])("%j in %s", (text, unit, expected) => expectNear(valueOf(text, unit), expected, Math.abs(expected) * 1e-12, text));
});

test.each(["-0", "\u22120.0", "-0 Hz"])("%j is zero without a sign", (text) => expect(valueOf(text, "Hz")).toBe(0));

describe("refuses what is no quantity of that kind", () => {
  test.each<[string, Unit, RegExp]>([
    ["", "chip", /^Nothing was handed in\.$/],
    [" \u2009 ", "chip", /^Nothing was handed in\.$/],
    ["NaN", "chip", /is not a number/],
    ["Infinity", "chip", /is not a number/],
    ["-", "chip", /is not a number/],
    ["about 5", "chip", /is not a number/],
    ["1e999", "chip", /too large/],
    ["-1e999 Hz", "Hz", /too large/],
    ["1e16", "chip", /too large/],
    ["1e14 MHz", "Hz", /too large/],
    ["0x10", "1", /“x10” is not a unit/],
    ["1_000", "1", /not a unit/],
    ["12 34", "chip", /more than one number/],
    ["1 2345", "Hz", /more than one number/],
    ["12-34", "chip", /not a unit/],
    ["1.234.5", "chip", /two decimal marks/],
    ["1,234.5", "chip", /two decimal marks/],
    ["1.234,5", "chip", /two decimal marks/],
    ["5 Hz", "chip", /^Hz does not fit\. This quantity is in chip\.$/],
    ["45 dB", "dB-Hz", /^dB does not fit\. This quantity is in dB-Hz\.$/],
    ["403 m", "us", /^m does not fit\. This quantity is in µs\.$/],
    ["5 furlong", "m", /“furlong” is not a unit known here\. This quantity is in m\.$/],
    ["5 chip", "1", /^chip does not fit\. This is a plain number\.$/],
    ["1".repeat(61), "chip", /too long/],
    ["5 __proto__", "chip", /not a unit/],
  ])("%j in %s", (text, unit, problem) =>
    expect(parseQuantity(text, unit)).toEqual({ problem: expect.stringMatching(problem) }),
  );
});

describe("asks about a comma before exactly three figures", () => {
  test.each([
    ["1,234", "1.234", "1234"],
    ["-12,345", "-12.345", "-12345"],
    ["\u22121,750 Hz", "-1.750", "-1750"],
  ])("%s", (text, point, thousands) => {
    const reading = parseQuantity(text, "Hz");
    expect(reading).toEqual({ problem: expect.stringMatching(/^Is the comma in .* a decimal mark/) });
    expect(reading).toEqual({ problem: expect.stringContaining(`Write ${point} or ${thousands}.`) });
  });
  test.each([
    ["1,2345", 1.2345],
    ["1,23", 1.23],
  ])("%s is plain", (text, value) => expect(valueOf(text, "Hz")).toBe(value));
});

const characters = fc.constantFrom(
  ...Array.from("0123456789..,,  eE+-\u2212^x\u00d7%\u00b5\u03c3\u00b2mHzkdBchip_\u0000\ud83d"),
);
const typed = fc.string({ unit: characters, maxLength: 40 });

test("never throws and never gives anything but a finite number or a sentence", () => {
  fc.assert(
    fc.property(typed, fc.constantFrom<Unit>("chip", "Hz", "%", "1", "dB-Hz"), (text, unit) => {
      const reading = parseQuantity(text, unit);
      expect("value" in reading ? Number.isFinite(reading.value) : reading.problem.length > 0).toBe(true);
    }),
    { seed: 20261201, numRuns: 2000 },
  );
});

test("reads back what formatQuantity prints", () => {
  const value = fc.double({ min: -1e9, max: 1e9, noNaN: true });
  fc.assert(
    fc.property(value, fc.constantFrom<Unit>("chip", "Hz", "us", "dB-Hz", "sigma2", "%"), (number, unit) => {
      expectNear(valueOf(formatQuantity(number, unit, 3), unit), number, 0.000501, "read back");
    }),
    { seed: 20261202, numRuns: 2000 },
  );
});

test("a thousand of a smaller unit is one of the larger", () =>
  expectNear(convert(1750, "Hz", "kHz"), 1.75, 1e-12, "kHz"));
