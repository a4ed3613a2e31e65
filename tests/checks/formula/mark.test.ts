import { describe, expect, test } from "vitest";
import { markAnswers } from "@/lib/checks/formula/markAnswers";
import { CHAIN, DELAY, planFrom } from "./plan";

/*
 * 50 m of cable at 0.80 of the speed of light: 50 / (0.8 * 299 792 458) s = 208.4776 ns, in air 166.7820 ns. The range left
 * uncorrected is 208.4776 ns of light, 62.5 m. -125 dBm less 20 dB/100 m over 50 m is -135 dBm. Worked by hand.
 */
const plan = planFrom(CHAIN);
const TRUTH = {
  givens: { L: 50, vf: 0.8, a: 20, P: -125 },
  right: { delay: 208.4776, error: 62.5, out: -135 },
  wrong: { air: 166.782, metre: -1125, gain: -115 },
};
const mark = (delay: string, error = "62.5 m", out = "-135 dBm", over = plan) =>
  markAnswers(TRUTH, over, { "quantities.delay": delay, "quantities.error": error, "quantities.out": out });
const row = (marking: ReturnType<typeof mark>, id: string) => marking.rows.find(({ quantity }) => quantity === id)!;

test("the computed values are those of the hand calculation", () => {
  const marking = mark("208.48");
  expect(marking.rows.map(({ computed }) => computed)).toEqual([
    "208.5\u00a0ns",
    "62.50\u00a0m",
    "\u2212135.00\u00a0dBm",
  ]);
  expect(marking.rows.map(({ tolerance }) => tolerance)).toEqual(["±1\u00a0ns", "±0.5\u00a0%", "±0.2\u00a0dB"]);
  expect([marking.marking, marking.met]).toEqual(["formula@1", true]);
});

test.each(["208.4776", "208.48 ns", "0.20848 us", "208,48", "2.0848e-7 s", "207.5", "209.4"])("%j is within", (typed) =>
  expect(row(mark(typed), "delay").within).toBe(true),
);

test.each<[string, RegExp]>([
  ["207.4", /below the computed one/],
  ["", /Nothing was handed in/],
  ["NaN", /not a number/],
  ["1e400", /too large/],
  ["-0", /below/],
  ["208.48 m", /does not fit/],
  ["1,234", /decimal mark/],
  ["\u2212208.48", /The size agrees; the sign does not/],
])("%j is outside and told why", (typed, says) => {
  const { within, reason } = row(mark(typed), "delay");
  expect(within).toBe(false);
  expect(reason).toMatch(says);
});

test("the wrong way that was gone is named", () => {
  expect(row(mark("166.8"), "delay")).toMatchObject({ errorClass: "speed of light in air", within: false });
  expect(row(mark("208", undefined, "-115"), "out")).toMatchObject({ errorClass: "loss added" });
  expect(row(mark("190"), "delay").errorClass).toBeNull();
});

describe("what follows is judged against the own earlier value", () => {
  test("right from a wrong delay", () => {
    // 166.782 ns of light are 50 m.
    const marking = mark("166.782", "50.0 m");
    expect(marking.quantities.map(({ of, within }) => [of, within])).toEqual([
      ["delay", false],
      ["error", true],
      ["out", true],
    ]);
    expect(row(marking, "error").computed).toBe("50.00\u00a0m");
  });
  test("and not right any more from the right value of another", () =>
    expect(row(mark("166.782", "62.5 m"), "error").within).toBe(false));
  test("what cannot be read counts once", () => {
    const marking = mark("about 200", "62.5 m");
    expect(marking.withinCount).toBe(2);
  });
  test("an own value that leads nowhere is not followed", () => {
    const rooted = planFrom({
      ...CHAIN,
      quantities: [
        CHAIN.quantities[0]!,
        { ...CHAIN.quantities[1]!, answer: "sqrt(delay * delay * delay / delay) * c" },
        CHAIN.quantities[2]!,
      ],
    });
    expect(row(mark("0", "62.5", "-135", rooted), "error").computed).toBe("62.50\u00a0m");
  });
});

test("a critical quantity outside is enough, whatever the number needed", () => {
  expect(mark("166.8", "50 m", "-135", { ...plan, needs: 2 }).met).toBe(false);
  expect(mark("208.5", "99 m", "-135", { ...plan, needs: 2 }).met).toBe(true);
});

test("workings show givens, formulas with their values, and where the wrong ways lead", () => {
  const { workings } = mark("208.5");
  expect(workings).toContainEqual({ label: "Cable length, L", value: "50.0\u00a0m" });
  expect(workings).toContainEqual({ label: "Cable delay, delay", value: "L / (vf * c) = 208.5\u00a0ns" });
  expect(workings).toContainEqual({ label: "Wrong way: speed of light in air", value: "L / c = 166.8\u00a0ns" });
});

test("a share of the right value is a tolerance for a plain number too, but points for one in %", () => {
  const share = planFrom({
    ...DELAY,
    givens: [{ id: "x", label: "x", unit: "1", from: 200, to: 200, step: 1 }],
    quantities: [
      { id: "one", label: "one", unit: "1", answer: "x", tolerance: { value: 2, unit: "%" }, critical: false },
      {
        id: "part",
        label: "part",
        unit: "%",
        answer: "one / 400",
        tolerance: { value: 2, unit: "%" },
        critical: false,
      },
    ],
    wrongs: [],
  });
  const truth = { givens: { x: 200 }, right: { one: 200, part: 50 }, wrong: {} };
  const within = (one: string, part: string) =>
    markAnswers(truth, share, { "quantities.one": one, "quantities.part": part }).rows.map((one) => one.within);
  expect(within("203.9", "48.9")).toEqual([true, false]); // 203.9 / 400 is 50.975 %
  expect(within("203.9", "51")).toEqual([true, true]);
  expect(within("204.1", "49.1")).toEqual([false, true]); // 204.1 / 400 is 51.025 %
});
