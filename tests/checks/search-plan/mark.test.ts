import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { attain } from "@/lib/checks/search-plan/attain";
import type { SearchPlanTruth } from "@/lib/checks/search-plan/drawCase";
import { markAnswers } from "@/lib/checks/search-plan/markAnswers";
import { thresholdFor } from "@/lib/checks/search-plan/planGrid";
import { searchPlan as kind } from "@/lib/checks/search-plan/searchPlan";
import { expectNear } from "@/tests/support/expectNear";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);
const truthAt = (cn0DbHz: number): SearchPlanTruth => ({
  requirement: { cn0DbHz, windowHz: 5000, detection: 0.94, falseAlarmPerSearch: 1e-3, correlators: 2046 },
  timeLimitS: 9.8,
  reference: {
    coherentMs: 4,
    sums: 20,
    dopplerBinHz: 125,
    codeStepChips: 0.5,
    timeS: 1,
    thresholdSigma2: 1,
    detection: 1,
  },
  gridPlans: 10,
  passingPlans: 5,
});

describe("what a plan attains at Pfa 1e-3 per search, +-5 kHz, half a chip", () => {
  // Worked out by an independent program (numerical Python, fixed seeds) before this code was written; it drew code offset,
  // Doppler offset and bit flips as here, 400 to 5 000 times, and printed two or three figures.
  test.each([
    [34, 1, 20, 500, 0.51, 0.03],
    [34, 1, 60, 500, 0.995, 0.005],
    [34, 4, 10, 125, 0.996, 0.005],
    [31, 4, 10, 125, 0.64, 0.03],
    [31, 4, 20, 125, 0.978, 0.01],
    [31, 10, 10, 50, 0.997, 0.005],
    [31, 10, 10, 100, 0.971, 0.01],
    [31, 20, 5, 25, 0.93, 0.02],
  ])("%i dB-Hz, %i ms x %i, bins of %i Hz: %d", (cn0DbHz, coherentMs, sums, dopplerBinHz, expected, tolerance) => {
    const truth = truthAt(cn0DbHz);
    const set = { coherentMs, sums, dopplerBinHz, codeStepChips: 0.5 };
    const thresholdSigma2 = thresholdFor(set, truth.requirement);
    expectNear(attain(seedOf(1), truth, { ...set, thresholdSigma2 }).detection, expected, tolerance, "detection");
  });

  test("42 966 cells of a 500 Hz, half-chip search and their time", () => {
    // (2 * 5000/500 + 1) * 1023/0.5 = 42 966, 1 ms each: 42.966 s (textbook count; Kaplan & Hegarty 5.8).
    const { requirement } = truthAt(31);
    const one = { ...truthAt(31), requirement: { ...requirement, correlators: 1 } };
    const set = { coherentMs: 1, sums: 1, dopplerBinHz: 500, codeStepChips: 0.5, thresholdSigma2: 30.5366 };
    const attained = attain(seedOf(1), one, set);
    expectNear(attained.cells, 42_966, 0, "cells");
    expectNear(attained.searchTimeS, 42.966, 1e-9, "time");
    // Threshold for 1 % over these cells, one sum (same handbook, worked to six figures).
    expectNear(attained.falseAlarmPerSearch, 0.01, 2e-6, "false alarms");
  });
});

const thresholdOf = (coherentMs: number, sums: number, dopplerBinHz: number) =>
  thresholdFor({ coherentMs, sums, dopplerBinHz, codeStepChips: 0.5 }, truthAt(31).requirement);

/** 4 ms x 20, 125 Hz, half a chip at 31 dB-Hz: 97.8 %, 165 726 cells, 6.48 s. */
const good: Answers = {
  "plan.coherent": "4 ms",
  "plan.sums": "20",
  "plan.bin": "125 Hz",
  "plan.step": "0.5 chip",
  "plan.threshold": (Math.ceil(thresholdOf(4, 20, 125) * 10) / 10).toFixed(1),
  "estimate.detection": "97",
  "estimate.falseAlarm": "1e-3",
  "estimate.time": "6.5",
};
const mark = (answers: Answers) => markAnswers(seedOf(2), truthAt(31), plan, { ...good, ...answers });
const rowOf = (quantity: string, answers: Answers) => mark(answers).rows.find((row) => row.quantity === quantity);

test("a plan that meets the requirement, estimated well, is met", () => {
  const marking = mark({});
  expect(marking.rows.filter(({ within }) => !within)).toEqual([]);
  expect(marking.met).toBe(true);
});

test("the plan itself is judged, not its likeness to another: a shorter one with room in the limit does", () =>
  expect(rowOf("time", { "plan.coherent": "10", "plan.bin": "100", "plan.sums": "10" })?.computed).toBe("10.1\u00a0s"));

describe("outside, with the reason", () => {
  test.each<[string, Answers, string | null]>([
    ["detection", { "plan.sums": "5" }, "too little added up"],
    ["detection", { "plan.coherent": "10", "plan.bin": "500" }, "bin not shrunk with the coherent time"],
    [
      "detection",
      {
        "plan.coherent": "20",
        "plan.sums": "3",
        "plan.bin": "33",
        "plan.threshold": thresholdOf(20, 3, 33).toFixed(1),
      },
      "bit edges not known",
    ],
    ["falseAlarm", { "plan.threshold": "73.4" }, "false alarm per cell"],
    ["falseAlarm", { "plan.threshold": (thresholdOf(4, 20, 125) / 2).toFixed(1) }, "noise power of I and Q together"],
    ["falseAlarm", { "plan.threshold": "100" }, null],
    ["time", { "plan.sums": "40" }, "too slow"],
    ["ownDetection", { "estimate.detection": "60" }, null],
    ["ownDetection", { "estimate.detection": "0.978" }, "fraction for per cent"],
    ["ownFalseAlarm", { "estimate.falseAlarm": "6e-9" }, "false alarm per cell"],
    ["ownFalseAlarm", { "estimate.falseAlarm": "0.0025" }, null],
    ["ownFalseAlarm", { "estimate.falseAlarm": "0" }, null],
    ["ownFalseAlarm", { "estimate.falseAlarm": "-0.001" }, null],
    ["ownTime", { "estimate.time": "3.24" }, "half of the window"],
    ["ownTime", { "estimate.time": "0.324" }, "number of sums left out"],
    ["ownTime", { "estimate.time": "7.2" }, null],
  ])("%s %j", (quantity, answers, errorClass) => {
    const row = rowOf(quantity, answers);
    expect(row).toMatchObject({ within: false, errorClass });
    expect(row?.reason).toBeTruthy();
  });
});

test("estimates are judged by what the plan attains, whatever is required", () => {
  const marking = mark({
    "plan.sums": "10",
    "plan.threshold": "79",
    "estimate.detection": "62",
    "estimate.time": "3.24",
  });
  const within = (of: string) => marking.quantities.find((quantity) => quantity.of === of)?.within;
  expect(within("detection")).toBe(false);
  expect(within("ownDetection")).toBe(true);
  expect(within("ownTime")).toBe(true);
});

test.each<[string, RegExp]>([
  ["plan.coherent", /^Coherent time: /],
  ["plan.sums", /^Number of sums: /],
  ["plan.bin", /^Doppler bin: /],
  ["plan.step", /^Code step: /],
  ["plan.threshold", /^Threshold: /],
])("a plan without %s is not computed, and says so in every row", (field, reason) => {
  for (const typed of ["", "NaN", "1e999", "-1", "0"]) {
    const marking = mark({ [field]: typed });
    expect(marking.withinCount).toBe(0);
    expect(marking.rows[0].reason).toMatch(reason);
    expect(marking.rows.every((row) => row.computed === "not computed" && row.reason !== null)).toBe(true);
  }
});

test.each([
  ["plan.sums", "2.5", "Number of sums: this is a whole number."],
  ["plan.coherent", "25 ms", "Coherent time: from 0.1\u00a0ms to 20\u00a0ms can be computed."],
  ["plan.step", "2", "Code step: from 0.1\u00a0chip to 1\u00a0chip can be computed."],
])("%s of %s is refused", (field, typed, reason) => expect(mark({ [field]: typed }).rows[0].reason).toBe(reason));

test("an empty hand-in is outside everywhere", () => {
  const marking = markAnswers(seedOf(2), truthAt(31), plan, {});
  expect(marking.withinCount).toBe(0);
  expect(marking.rows[0].reason).toBe("Nothing was handed in.");
});

test("marking twice gives the same bytes", () => {
  const [first, second] = [1, 2].map(() => JSON.stringify(kind.mark(seedOf(4), plan, good)));
  expect(second).toBe(first);
});
