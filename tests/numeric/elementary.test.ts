import { describe, expect, test } from "vitest";
import * as elementary from "@/lib/numeric/elementary";
import { expectNear } from "@/tests/support/expectNear";

const { atan2, cos, cosTurns, decibels, exp, expm1, log, log10, log1p, pow10, pow10Db, sin, sinTurns } = elementary;
const RELATIVE = 1e-15;

/** Evenly spread points, ends included. */
const grid = (from: number, to: number, count = 4001) =>
  Array.from({ length: count }, (_, n) => from + ((to - from) * n) / (count - 1));

function expectSame(ours: (x: number) => number, reference: (x: number) => number, points: number[], what: string) {
  for (const x of points) expectNear(ours(x), reference(x), RELATIVE * Math.abs(reference(x)), `${what}(${x})`);
}

describe("printed values", () => {
  // Abramowitz & Stegun, Handbook of Mathematical Functions (1964): Table 4.4 (exponential), 4.2 (natural logarithm),
  // Table 4.6 (circular functions, radians), Table 4.14 (inverse tangent), Table 1.1 (constants).
  test.each([
    ["exp(1)", exp(1), 2.718281828459045235],
    ["exp(-1)", exp(-1), 0.367879441171442322],
    ["exp(0.5)", exp(0.5), 1.648721270700128147],
    ["exp(10)", exp(10), 22026.465794806717],
    ["log(2)", log(2), 0.693147180559945309],
    ["log(3)", log(3), 1.098612288668109691],
    ["log(10)", log(10), 2.302585092994045684],
    ["log10(2)", log10(2), 0.301029995663981195],
    ["log10(3)", log10(3), 0.477121254719662437],
    ["sin(0.5)", sin(0.5), 0.479425538604203],
    ["sin(1)", sin(1), 0.841470984807896507],
    ["cos(0.5)", cos(0.5), 0.877582561890372716],
    ["cos(1)", cos(1), 0.540302305868139717],
    ["arctan 1", atan2(1, 1), 0.78539816339744831],
    ["arctan 0.5", atan2(0.5, 1), 0.463647609000806116],
    ["sin 1/8 turn", sinTurns(1 / 8), 0.707106781186547524],
    ["cos 1/12 turn", cosTurns(1 / 12), 0.866025403784438647],
    ["10^0.5", pow10(0.5), 3.162277660168379332],
  ])("%s", (what, actual, printed) => expectNear(actual, printed, RELATIVE * Math.abs(printed), what));
});

describe("a general-purpose reference, the engine's own functions, on grids", () => {
  test("exp", () => expectSame(exp, Math.exp, [...grid(-700, 700), ...grid(-1, 1)], "exp"));
  test("log", () => expectSame(log, Math.log, [...grid(1e-3, 20), ...grid(0.9, 1.1), 5e-324, 1e-310, 1e300], "log"));
  test("log10", () => expectSame(log10, Math.log10, [...grid(1e-3, 2000), ...grid(0.99, 1.01)], "log10"));
  test("log1p", () => expectSame(log1p, Math.log1p, [...grid(-0.5, 0.5), ...grid(-1e-8, 1e-8, 101)], "log1p"));
  test("expm1", () => expectSame(expm1, Math.expm1, [...grid(-5, 5), ...grid(-1e-8, 1e-8, 101)], "expm1"));
  test("sin and cos over many turns", () => {
    expectSame(sin, Math.sin, [...grid(-10, 10), ...grid(-1e6, 1e6)], "sin");
    expectSame(cos, Math.cos, [...grid(-10, 10), ...grid(-1e6, 1e6)], "cos");
  });
  test("atan2 all round", () => {
    for (const turn of grid(-0.5, 0.5, 721).slice(1, -1)) {
      const [y, x] = [Math.sin(2 * Math.PI * turn), Math.cos(2 * Math.PI * turn)];
      expectNear(atan2(y, x), Math.atan2(y, x), RELATIVE * 4, `atan2 at ${turn} turns`);
    }
  });
  test("pow10", () => expectSame(pow10, (x) => 10 ** x, [...grid(-22, 22), ...grid(-300, 300)], "pow10"));
});

test("whole powers of ten and their logarithms are exact", () => {
  for (let n = 0; n <= 22; n++) {
    expect(pow10(n)).toBe(Number(`1e${n}`));
    expectNear(log10(Number(`1e${n}`)), n, 2e-16 * n, `log10(1e${n})`);
  }
});

test("the edges of the number range", () => {
  expect(exp(-Infinity)).toBe(0);
  expect(exp(800)).toBe(Infinity);
  expect(exp(0)).toBe(1);
  expectNear(exp(-740), Math.exp(-740), 5e-324, "exp(-740), subnormal");
  expect(log(0)).toBe(-Infinity);
  expect(log(-1)).toBeNaN();
  expect(log(Infinity)).toBe(Infinity);
  expect(log(1)).toBe(0);
  expect(atan2(0, 0)).toBe(0);
  expectNear(atan2(0, -1), Math.PI, 0, "atan2(0, -1)");
  expect(() => sin(2e6)).toThrow(RangeError);
  expect(() => cos(NaN)).toThrow(RangeError);
});

test("whole turns fall away exactly, however many", () => {
  for (const turn of [0.1, 0.37, 0.75]) {
    // 2^30 turns leave 22 bits of the fraction, and those are kept exactly
    const kept = turn + 2 ** 30 - 2 ** 30;
    expect(sinTurns(kept + 2 ** 30)).toBe(sinTurns(kept));
    expect(cosTurns(kept + 2 ** 30)).toBe(cosTurns(kept));
  }
  expect([0, 0.25, 0.5, 0.75].map(sinTurns)).toEqual([0, 1, -0, -1]);
});

test("decibels and power ratios undo each other", () => {
  expectNear(pow10Db(3), 1.9952623149688795, 2e-15, "3 dB"); // 10^0.3
  for (const dB of grid(-200, 200, 401)) expectNear(decibels(pow10Db(dB)), dB, 2e-13, `${dB} dB there and back`);
});
