import { describe, expect, test } from "vitest";
import type { SidePeakTruth } from "@/lib/checks/side-peak/drawCase";
import { markAnswers } from "@/lib/checks/side-peak/markAnswers";
import { sidePeak as kind } from "@/lib/checks/side-peak/sidePeak";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);
const { truth: drawn } = kind.build(seedOf(5), plan);

/**
 * Peaks put where they can be worked by hand: 0.52 chip is 152.39 m, 0.54 chip 158.25 m (293.0523 m a chip, the speed of
 * light over 1.023 MHz); half the magnitude is 6.0206 dB down, two fifths 7.9588 dB.
 */
const truth: SidePeakTruth = {
  ...drawn,
  tracked: "later",
  trackedLagChips: 812.542,
  fromChips: 811,
  peaks: {
    main: { lagChips: 812, level: 100 },
    earlier: { lagChips: 811.48, level: 50 },
    later: { lagChips: 812.54, level: 40 },
  },
};
const right = {
  "lock.peak": "side",
  "lock.lag": "812.00",
  "lock.bias": "158.8",
  "earlier.bias": "-152.4",
  "earlier.level": "6.0",
  "later.bias": "158.2",
  "later.level": "8.0",
};
const marked = (answers: Record<string, string>, of: SidePeakTruth = truth) =>
  markAnswers(of, plan, { ...right, ...answers });
const row = (quantity: string, answers: Record<string, string>, subject: string | null = null) =>
  marked(answers).rows.find((one) => one.quantity === quantity && one.subject === subject);

test("values worked by hand meet the check", () => expect(marked({}).met).toBe(true));

describe("the tracked peak is critical", () => {
  test.each([
    ["main", "side peak taken for the main one"],
    ["reflection", "taken for a reflection"],
  ])("%s", (typed, errorClass) => {
    const marking = markAnswers(truth, { ...plan, needs: 1 }, { ...right, "lock.peak": typed });
    expect(marking.met).toBe(false);
    expect(marking.rows[0]).toMatchObject({ within: false, critical: true, errorClass });
    expect(marking.rows[0]?.reason).toMatch(
      /^The highest peak stands at 812.000\u00a0chip, 0.54\u00a0chip before the tracked lag\./,
    );
  });
  test.each(["", "side peak", "true", "__proto__"])("%j is no word of the list", (typed) =>
    expect(row("peak", { "lock.peak": typed })?.within).toBe(false),
  );
  test("a good lock called false is outside too", () => {
    const good: SidePeakTruth = { ...truth, tracked: "main", trackedLagChips: 812.003 };
    expect(marked({ "lock.peak": "side", "lock.bias": "0.9" }, good).rows[0]).toMatchObject({
      within: false,
      errorClass: "main peak called false",
    });
    expect(marked({ "lock.peak": "main", "lock.bias": "0" }, good).met).toBe(true);
  });
});

describe("lag", () => {
  test.each([
    ["812.02", true, null],
    ["812.021", false, null],
    ["812,01 chip", true, null],
    ["812.54", false, "side peak taken for the main one"],
    ["811.48", false, "side peak taken for the main one"],
  ])("%s", (typed, within, errorClass) =>
    expect(row("lag", { "lock.lag": typed })).toMatchObject({ within, errorClass }),
  );
  test.each([
    ["1e9", /The trace runs from 811.00 to 814.60/],
    ["-812", /The trace runs from/],
    ["812 m", /does not fit/],
    ["NaN", /is not a number/],
    ["", /Nothing was handed in/],
  ])("%j is outside without a difference", (typed, reason) =>
    expect(row("lag", { "lock.lag": typed })).toMatchObject({
      within: false,
      difference: null,
      reason: expect.stringMatching(reason),
    }),
  );
});

describe("bias of the lock", () => {
  test.each([
    ["158.8", true, null],
    ["163.8", true, null],
    ["164", false, null],
    ["0.159 km", true, null],
    ["\u2212158.8", false, "sign"],
    ["293", false, "whole chip for half a chip"],
    ["0", false, "bias left out"],
  ])("%s", (typed, within, errorClass) =>
    expect(row("bias", { "lock.bias": typed })).toMatchObject({ within, errorClass }),
  );

  // 812.542 less 812.1 is 0.442 chip, 129.53 m.
  test("follows the candidate's own lag of the main peak", () => {
    const own = { "lock.lag": "812.1", "lock.bias": "129.5" };
    expect(row("lag", own)?.within).toBe(false);
    expect(row("bias", own)?.within).toBe(true);
    expect(row("bias", { ...own, "lock.bias": "158.8" })).toMatchObject({
      within: false,
      reason: expect.stringMatching(/your own main peak at 812\.1/),
    });
  });
  test.each(["", "?", "5000"])("without an own lag on the trace (%j) the true one is the base", (lag) =>
    expect(row("bias", { "lock.lag": lag })?.within).toBe(true),
  );
});

describe("side peaks", () => {
  test.each([
    ["earlier", "-152.4", true, null],
    ["earlier", "152.4", false, "sign"],
    ["earlier", "-158", false, null],
    ["later", "153.3", true, null],
    ["later", "-158.2", false, "sign"],
    ["later", "293", false, "whole chip for half a chip"],
  ])("bias on the %s one, %s", (side, typed, within, errorClass) =>
    expect(row("sideBias", { [`${side}.bias`]: typed }, side)).toMatchObject({ within, errorClass }),
  );
  test.each([
    ["earlier", "6.7", true, null],
    ["earlier", "-6.0 dB", true, null],
    ["earlier", "3.0", false, "power formula on an amplitude"],
    ["earlier", "8.0", false, "sides exchanged"],
    ["later", "6", false, "formula for reading"],
    ["later", "8,6", true, null],
    ["later", "8.7", false, null],
    ["later", "8 dBm", false, null],
  ])("level of the %s one, %s", (side, typed, within, errorClass) =>
    expect(row("sideLevel", { [`${side}.level`]: typed }, side)).toMatchObject({ within, errorClass }),
  );
  test("one side outside puts the quantity outside", () => {
    const { quantities } = marked({ "later.level": "5" });
    expect(quantities.filter(({ within }) => !within).map(({ of }) => of)).toEqual(["sideLevel"]);
  });
});
