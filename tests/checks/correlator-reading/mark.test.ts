import { describe, expect, test } from "vitest";
import { correlatorReading as kind } from "@/lib/checks/correlator-reading/correlatorReading";
import type { CorrelatorReadingTruth } from "@/lib/checks/correlator-reading/drawCase";
import { markAnswers } from "@/lib/checks/correlator-reading/markAnswers";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind, { noiseOnly: 0 });
const built = kind.build(seedOf(5), plan);
const right = kind.solve(built, plan);

/** The same trace, its signal said to lie at 412.5 chip: the rows looked at here do not depend on the rest. */
const truth: CorrelatorReadingTruth = { ...built.truth, lagChips: 412.5 };
const at = { ...right, "reading.lag": "412.5", "reading.lagTime": "403.23", "reading.lagLength": "120884" };
const row = (quantity: string, answers: Record<string, string>) =>
  markAnswers(truth, plan, { ...at, ...answers }).rows.find((one) => one.quantity === quantity);

describe("lag", () => {
  test.each([
    ["412.5", true, null],
    ["412.7", true, null],
    ["412.71", false, null],
    ["412,5 chip", true, null],
    ["610.5", false, "mirrored delay (1 023 - x)"],
    ["3300", false, "cells for chips"],
  ])("%s", (typed, within, errorClass) =>
    expect(row("lag", { "reading.lag": typed })).toMatchObject({ within, errorClass }),
  );

  test.each([
    ["1e9", /A code is 1.023 chips long/],
    ["-1", /A code is 1.023 chips long/],
    ["403.2 us", /does not fit/],
    ["", /Nothing was handed in/],
  ])("%j is outside without a difference", (typed, reason) =>
    expect(row("lag", { "reading.lag": typed })).toMatchObject({
      within: false,
      difference: null,
      reason: expect.stringMatching(reason),
    }),
  );

  test("a lag of the second peak is a side lobe read as the peak", () => {
    // 24 dB under the peak or less: the second peak of a strong trace stands above twice the noise mean.
    const lag = String(built.truth.reading.secondLagChips);
    expect(row("lag", { "reading.lag": lag })).toMatchObject({ within: false, errorClass: "side lobe read as peak" });
  });
});

describe("conversions follow the candidate's own lag", () => {
  // 1 chip = 0.97752 us = 293.05 m (IS-GPS-200, 3.3.2.1, and the speed of light).
  test("a wrong lag converted rightly is within", () => {
    const own = { "reading.lag": "100", "reading.lagTime": "97.752", "reading.lagLength": "29305" };
    expect(row("lag", own)?.within).toBe(false);
    expect(row("lagTime", own)?.within).toBe(true);
    expect(row("lagLength", own)?.within).toBe(true);
  });

  test("the true lag in m is outside when the own lag says otherwise", () =>
    expect(row("lagLength", { "reading.lag": "100" })?.within).toBe(false));

  test("without a readable lag the true one is the base", () => {
    expect(row("lagTime", { "reading.lag": "" })?.within).toBe(true);
    expect(row("lagLength", { "reading.lag": "?" })?.within).toBe(true);
  });

  test.each([
    ["lagLength", { "reading.lagLength": "123750" }, "300 m chip"],
    ["lagLength", { "reading.lagLength": "120.884 km" }, null],
    ["lagTime", { "reading.lagTime": "412.5" }, "chips for microseconds"],
    ["lagTime", { "reading.lagTime": "596.8" }, "mirrored delay (1 023 - x)"],
    ["lagTime", { "reading.lagTime": "403230 ns" }, null],
  ])("%s %j", (quantity, answers, errorClass) =>
    expect(row(quantity, answers)).toMatchObject({ errorClass, within: errorClass === null }),
  );
});

describe("levels", () => {
  const { noiseMean, noiseMedian, noiseRms, threshold, highest, second } = built.truth.reading;
  const ratioDb = 20 * Math.log10(highest / second);

  test("threshold follows the candidate's own noise mean", () => {
    const own = { "reading.noiseMean": String(noiseMean * 2), "reading.threshold": String(threshold * 2) };
    expect(row("noiseMean", own)?.within).toBe(false);
    expect(row("threshold", own)?.within).toBe(true);
  });

  test.each([
    ["noiseMean", "reading.noiseMean", noiseMedian, "median for mean"],
    ["noiseMean", "reading.noiseMean", noiseRms, "rms for mean"],
    ["threshold", "reading.threshold", threshold * 1.2533, "mean taken for sigma"],
    ["threshold", "reading.threshold", noiseMean * 2.568, "three sigma of a Gaussian"],
    ["peakRatio", "reading.peakRatio", ratioDb / 2, "power formula on an amplitude"],
    ["peakRatio", "reading.peakRatio", -ratioDb, "sign"],
  ])("%s: %s", (quantity, field, value, errorClass) =>
    expect(row(quantity, { [field]: value.toFixed(4) })).toMatchObject({ within: false, errorClass }),
  );
});

describe("detection is critical", () => {
  test("the wrong word fails the check alone", () => {
    const marking = markAnswers(built.truth, { ...plan, needs: 1 }, { ...right, "reading.detection": "no" });
    expect(marking.met).toBe(false);
    expect(marking.rows[0]).toMatchObject({ within: false, critical: true, errorClass: "signal missed" });
  });
  test.each(["", "maybe", "true", "__proto__"])("%j is no word of the list", (typed) =>
    expect(row("detection", { "reading.detection": typed })?.within).toBe(false),
  );
});

test("noise alone: the highest cell is the lag, and a claimed signal is outside", () => {
  const noise = planOf(kind, { noiseOnly: 100 });
  const one = kind.build(seedOf(6), noise);
  const answers = kind.solve(one, noise);
  expect(answers["reading.detection"]).toBe("no");
  expect(markAnswers(one.truth, noise, answers).met).toBe(true);
  const claimed = markAnswers(one.truth, noise, { ...answers, "reading.detection": "yes" });
  expect(claimed.rows[0]).toMatchObject({ within: false, errorClass: "noise taken for a signal" });
});
