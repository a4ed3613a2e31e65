import { describe, expect, test } from "vitest";
import type { PulseAcceptanceTruth } from "@/lib/checks/pulse-acceptance/drawCase";
import { judgeLog, timeErrorOf } from "@/lib/checks/pulse-acceptance/judgeLog";
import { markAnswers } from "@/lib/checks/pulse-acceptance/markAnswers";
import { pulseAcceptance as kind } from "@/lib/checks/pulse-acceptance/pulseAcceptance";
import { expectNear } from "@/tests/support/expectNear";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);

/*
 * Worked by hand after the definitions of ITU-T G.810 (MTIE) and G.8260 (max|TE|): 20 ns up to 720 min, then 50, one
 * reading of 60 at 900 min, one missed trigger at 200 min. max|TE| is 60. MTIE over 300 s is 30, across the step; over
 * 6 000 s too, for the high reading comes 10 800 s after the step; over 15 000 s and more it is 40.
 */
const timeErrorNs = (n: number) => (n === 1800 ? 60 : n < 1440 ? 20 : 50);
const LEADS = { startCableNs: 20, stopCableNs: 45 };
const readingsNs = Array.from({ length: 2881 }, (_, n) => (n === 400 ? 700 : timeErrorNs(n) + 25));
const truthFor = (longS: number): PulseAcceptanceTruth => {
  const intervals = { shortS: 300, longS };
  const series = timeErrorOf(30, readingsNs, LEADS);
  series.valuesNs[400] = NaN;
  return {
    clock: "PRTC-B",
    limitNs: 40,
    ...LEADS,
    intervals,
    intervalS: 30,
    readingsNs,
    shape: {
      waveNs: 0,
      sawtoothNs: 0,
      step: { index: 1440, sizeNs: 30 },
      triggers: [{ index: 400, sizeNs: 655 }],
    },
    figures: judgeLog(series, intervals),
    accepted: false,
  };
};
const truth = truthFor(30_000);
const right = {
  "log.mean": "35.0",
  "log.maxTe": "60",
  "log.mtieShort": "30",
  "log.mtieLong": "40",
  "step.seen": "yes",
  "step.time": "720",
  "verdict.kept": "refuse",
};
const marked = (answers: Record<string, string>) => markAnswers(truth, plan, { ...right, ...answers });
const rowsOf = (quantity: string, answers: Record<string, string>) =>
  marked(answers).rows.filter((row) => row.quantity === quantity);

test("the log worked by hand", () => {
  // 1 440 readings before the step, one of them the missed trigger; 1 441 after it, one of them high.
  expectNear(truth.figures.meanNs, (1439 * 20 + 1440 * 50 + 60) / 2880, 1e-9, "mean");
  expect(truth.figures).toMatchObject({ maxTeNs: 60, peakToPeakNs: 40, mtieShortNs: 30, mtieLongNs: 40 });
  expect(truthFor(15_000).figures.mtieLongNs).toBe(40);
  expect(truthFor(6_000).figures.mtieLongNs).toBe(30);
  expect(marked({}).rows.filter(({ within }) => !within)).toEqual([]);
  expect(marked({}).met).toBe(true);
});

describe("classes of error", () => {
  test.each<[string, string, string, string | null]>([
    ["mean", "log.mean", "60", "leads not taken off"],
    ["mean", "log.mean", "85", "leads taken off the wrong way"],
    ["mean", "log.mean", "-35", "sign"],
    ["mean", "log.mean", "30", null],
    ["maxTe", "log.maxTe", "25.0", "mean removed"],
    ["maxTe", "log.maxTe", "15.0", "standard deviation for maximum"],
    ["maxTe", "log.maxTe", "40", "peak to peak for maximum"],
    ["maxTe", "log.maxTe", "85", "leads not taken off"],
    ["maxTe", "log.maxTe", "110", "leads taken off the wrong way"],
    ["maxTe", "log.maxTe", "675", "missed triggers left in"],
    ["mtieShort", "log.mtieShort", "40", "whole day for the interval"],
    ["mtieShort", "log.mtieShort", "655", "missed triggers left in"],
    ["mtieLong", "log.mtieLong", "30", "the other interval"],
    ["step", "step.seen", "no", "step missed"],
    ["step", "step.time", "200", "missed trigger taken for the step"],
    ["step", "step.time", "1440", "readings for minutes"],
    ["step", "step.time", "700", null],
    ["verdict", "verdict.kept", "accept", "accepted above the limit"],
  ])("%s: %s of %s is %s", (quantity, field, typed, errorClass) => {
    const outside = rowsOf(quantity, { [field]: typed }).filter(({ within }) => !within);
    expect(outside).toEqual([expect.objectContaining({ errorClass, reason: expect.stringMatching(/\.$/) })]);
  });
});

test("the verdict fails the check alone, and follows the log and not the own max|TE|", () => {
  const marking = markAnswers(truth, { ...plan, needs: 1 }, { ...right, "log.maxTe": "25", "verdict.kept": "accept" });
  expect(marking.met).toBe(false);
  expect(marking.rows.at(-1)).toMatchObject({ within: false, critical: true });
});

describe("a log without a step", () => {
  const still = { ...truth, shape: { ...truth.shape, step: null } };
  const mark = (answers: Record<string, string>) => markAnswers(still, plan, { ...right, ...answers });
  test("says so, and has no time to mark", () => {
    const rows = mark({ "step.seen": "no", "step.time": "" }).rows.filter(({ quantity }) => quantity === "step");
    expect(rows).toEqual([expect.objectContaining({ within: true })]);
  });
  test("a claimed step is a wave taken for one", () =>
    expect(mark({}).rows.find(({ quantity }) => quantity === "step")).toMatchObject({
      within: false,
      errorClass: "wave taken for a step",
    }));
  test("nothing there alone does not meet it", () =>
    expect(markAnswers(still, plan, { "step.seen": "no", "verdict.kept": "refuse" }).met).toBe(false));
});

describe("units and figures as people type them", () => {
  test.each([
    ["log.mean", "0.035 us"],
    ["log.maxTe", "60,0"],
    ["log.maxTe", "0,06 µs"],
    ["step.time", "12 h"],
    ["step.time", "43200 s"],
  ])("%s of %s is within", (field, typed) => expect(marked({ [field]: typed }).met).toBe(true));

  test.each(["", "NaN", "1e400", "-0", "60 m", "1,234", "−60"])("%j is a sentence, never thrown", (typed) => {
    for (const field of Object.keys(right)) {
      const outside = marked({ [field]: typed }).rows.filter(({ within }) => !within);
      expect(outside.length, field).toBeGreaterThan(0);
      for (const { reason } of outside) expect(reason).toMatch(/[.?]$/);
    }
  });
});

test("marking twice gives the same bytes", () => {
  const [first, second] = [1, 2].map(() => JSON.stringify(kind.mark(seedOf(4), plan, right)));
  expect(second).toBe(first);
});
