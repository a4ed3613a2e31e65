import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { chain as kind } from "@/lib/checks/chain/chain";
import type { ChainTruth } from "@/lib/checks/chain/drawCase";
import { markAnswers } from "@/lib/checks/chain/markAnswers";
import { planOf, seedOf } from "../planOf";
import { named, SITE } from "./site";

const plan = planOf(kind);
const truth: ChainTruth = { site: SITE, best: named("A1", "C1", "S1", "D1"), goodChains: 1, possibleChains: 72 };
const chainOf = (...ids: string[]): Answers =>
  Object.fromEntries(Array.from({ length: 8 }, (_, n) => [`chain.${n + 1}.part`, ids[n] ?? ""]));

/** Figures as in figures.test.ts, worked there by hand. */
const good: Answers = {
  ...chainOf("A1", "C1", "S1", "D1"),
  "figures.gain": "9.5 dB",
  "figures.noise": "3,6",
  "figures.headroom": "9",
  "figures.delay": "0.414 us",
  "figures.volts": "4.48 V",
};
const mark = (answers: Answers) => markAnswers(truth, plan, { ...good, ...answers });
const rowOf = (quantity: string, answers: Answers) => mark(answers).rows.find((row) => row.quantity === quantity);

test("a chain that keeps every limit, with figures worked by hand, is met", () => {
  expect(mark({}).rows.filter(({ within }) => !within)).toEqual([]);
  expect(mark({}).met).toBe(true);
});

test("empty rows between the parts are passed over", () =>
  expect(mark({ "chain.1.part": "", ...shifted("A1", "C1", "S1", "D1") }).met).toBe(true));
const shifted = (...ids: string[]) =>
  Object.fromEntries(
    ids
      .map((id, n) => [`chain.${2 * n + 1}.part`, id])
      .concat(ids.slice(1).map((_, n) => [`chain.${2 * n + 2}.part`, " "])),
  );

describe("outside, with the class of error", () => {
  test.each<[string, Answers, string | null]>([
    ["order", chainOf("A1", "C1", "D1", "S1"), null],
    ["feed", chainOf("A1", "C1", "S2", "D1"), "direct current blocked"],
    ["feed", chainOf("A1", "C1", "S1", "D2"), "two feeds"],
    ["feed", chainOf("C1", "S1", "D1"), null],
    ["supply", chainOf("A1", "A2", "C1", "S1", "D1"), "too much current"],
    ["supply", chainOf("A1", "C1", "S2", "D1"), null],
    ["gain", chainOf("A1", "A2", "C1", "S1", "D1"), "too much gain"],
    ["gain", chainOf("A2", "C1", "S1", "D1"), "too little gain"],
    ["noise", chainOf("C1", "S1", "A1", "D1"), "amplifier behind the loss"],
    ["noise", chainOf("A2", "C1", "S1", "D1"), "noise figure too high"],
    ["overload", chainOf("A1", "A2", "C1", "S1", "D1"), "amplifier overdriven"],
    ["ownGain", { "figures.gain": "11.9" }, "loss at 1 GHz"],
    ["ownGain", { "figures.gain": "26" }, "losses left out"],
    ["ownGain", { "figures.gain": "8" }, null],
    ["ownNoise", { "figures.noise": "18.5" }, "noise figures added in dB"],
    ["ownNoise", { "figures.noise": "26.5" }, "noise figures added in dB"],
    ["ownNoise", { "figures.noise": "2" }, null],
    ["ownHeadroom", { "figures.headroom": "35" }, "gain left out"],
    ["ownHeadroom", { "figures.headroom": "\u22129" }, "sign"],
    ["ownHeadroom", { "figures.headroom": "7" }, null],
    ["ownDelay", { "figures.delay": "355" }, "speed of light in air"],
    ["ownDelay", { "figures.delay": "392.4" }, "delays of the parts left out"],
    ["ownDelay", { "figures.delay": "500" }, null],
    ["ownVolts", { "figures.volts": "5" }, "drop left out"],
    ["ownVolts", { "figures.volts": "4.6" }, null],
    ["ownVolts", { ...chainOf("A1", "C1", "S2", "D1") }, "no feed"],
  ])("%s %j", (quantity, answers, errorClass) => {
    const row = rowOf(quantity, answers);
    expect(row).toMatchObject({ within: false, errorClass });
    expect(row?.reason).toMatch(/[.?]$/);
  });
  test("too few volts at an amplifier", () => {
    const weak = { ...truth, site: { ...SITE, sourceOhm: 40 } };
    const row = markAnswers(weak, plan, good).rows.find(({ quantity }) => quantity === "supply");
    expect(row).toMatchObject({
      within: false,
      errorClass: "too few volts",
      reason: "A1 gets 3.28\u00a0V and needs 4\u00a0V.",
    });
  });
  test("loss before an amplifier left out of its headroom", () => {
    // 12.5 dB of run and arrester before it: -30 - 12.5 + 26 = -16.5 dBm against 5 dBm.
    const rack = chainOf("C1", "S1", "A1", "D1");
    expect(rowOf("ownHeadroom", { ...rack, "figures.headroom": "21.5" })?.within).toBe(true);
    expect(rowOf("ownHeadroom", rack)).toMatchObject({ errorClass: "loss before the amplifier left out" });
  });
});

test("figures are judged for the chain that was handed in, whether it will do or not", () => {
  const marking = mark({
    ...chainOf("C1", "S1", "A1", "D1"),
    "figures.noise": "14.6",
    "figures.headroom": "21.5",
    "figures.volts": "4.56", // nothing but feed resistance and splitter below it: 5 - 0.04 x 10.5 = 4.58
  });
  const within = (of: string) => marking.quantities.find((quantity) => quantity.of === of)?.within;
  expect(within("noise")).toBe(false);
  for (const own of ["ownGain", "ownNoise", "ownHeadroom", "ownDelay", "ownVolts"]) expect(within(own)).toBe(true);
});

test("a broken feed alone keeps the check from being met, whatever is needed", () => {
  const marking = markAnswers(truth, { ...plan, needs: 1 }, { ...good, ...chainOf("A1", "C1", "S2", "D1") });
  expect(marking.withinCount).toBeGreaterThan(4);
  expect(marking.met).toBe(false);
});

test("a tenth of a dB is for rounding, a fifth is not", () => {
  const limited = (noiseLimitDb: number) =>
    markAnswers({ ...truth, site: { ...SITE, noiseLimitDb } }, plan, good).rows.find(
      ({ quantity }) => quantity === "noise",
    );
  expect(limited(4.55)?.within).toBe(true); // 0.95 dB left
  expect(limited(4.4)?.within).toBe(false); // 0.80 dB left
});

describe("what is no chain", () => {
  test.each([
    ["", "Nothing was handed in."],
    ["A9", "“A9” is not on the list of parts."],
    ["__proto__", "“__proto__” is not on the list of parts."],
  ])("%j", (part, reason) => {
    const marking = mark(chainOf(part));
    expect(marking.withinCount).toBe(0);
    expect(marking.rows.every(({ computed }) => computed === "not computed")).toBe(true);
    expect(marking.rows[0].reason).toBe(reason);
  });
  test("without an amplifier its own figures are not asked", () => {
    const marking = mark(chainOf("C1", "S1", "D1"));
    expect(marking.rows.find(({ quantity }) => quantity === "ownVolts")?.reason).toBe("Your chain has no amplifier.");
    expect(marking.rows.find(({ quantity }) => quantity === "overload")?.within).toBe(false);
  });
});

test.each(["", "NaN", "1e400", "-0", "1,234", "5 m", "\u22125"])(
  "%j as every figure is marked and says why",
  (typed) => {
    const figures = Object.fromEntries(
      Object.keys(good)
        .filter((id) => id.startsWith("figures."))
        .map((id) => [id, typed]),
    );
    const marking = mark(figures);
    expect(marking.met).toBe(false);
    for (const row of marking.rows) if (!row.within) expect(row.reason).toMatch(/[.?]$/);
  },
);

test("marking twice gives the same bytes", () => {
  const [first, second] = [1, 2].map(() => JSON.stringify(kind.mark(seedOf(3), plan, good)));
  expect(second).toBe(first);
});
