import { describe, expect, test } from "vitest";
import type { JammedOrNotTruth } from "@/lib/checks/jammed-or-not/drawCase";
import { jammedOrNot as kind } from "@/lib/checks/jammed-or-not/jammedOrNot";
import { markAnswers } from "@/lib/checks/jammed-or-not/markAnswers";
import type { Verdict } from "@/lib/checks/jammed-or-not/quantities";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);
const some = kind.trial!.build(seedOf(0), plan).truth;

/** False signals from 12:10:00 on, the clock pulled from 12:15:00, an alarm at 12:14:00. */
const deceived: JammedOrNotTruth = {
  ...some,
  verdict: "deceived",
  log: { startUnixMs: Date.UTC(2026, 2, 14, 12, 0), intervalS: 5, readings: 720, trackEvery: 60, passes: [] },
  cn0ChangeDb: 3.4,
  alarm: 168,
  event: {
    ...some.event,
    verdict: "deceived",
    first: 120,
    pullsFrom: 180,
    gainDb: -5.2,
    clockNsS: 2,
    speedMS: [0, 0],
    seen: ["cn0-alike", "gain-down", "clock-ran", "doppler-common"],
  },
};
const as = (verdict: Verdict, gainDb: number): JammedOrNotTruth => ({
  ...deceived,
  verdict,
  event: { ...deceived.event, verdict, gainDb },
});
const right = {
  ...{ "finding.verdict": "deceived", "finding.start": "12:10:00", "finding.gainChange": "-5.2" },
  ...{ "finding.cn0Change": "3.4", "finding.first": "cn0-alike", "finding.second": "gain-down" },
};
const rows = (answers: Record<string, string>, truth = deceived) =>
  markAnswers(truth, plan, { ...right, ...answers }).rows;
const row = (quantity: string, answers: Record<string, string>, truth = deceived) =>
  rows(answers, truth).find((one) => one.quantity === quantity);

test("all of it right is met", () => expect(markAnswers(deceived, plan, right).met).toBe(true));

describe("verdict", () => {
  test.each([
    [deceived, "faulty", "C/N0 went up, so taken for better"],
    [as("faulty", 6), "jammed", "gain control not looked at"],
    [as("jammed", -6), "faulty", "gain control read the wrong way round"],
    [as("blocked", 0), "jammed", null],
  ])("%#: called %s", (truth, called, errorClass) =>
    expect(row("verdict", { "finding.verdict": called }, truth)).toMatchObject({
      within: false,
      critical: true,
      errorClass,
      reason: expect.stringMatching(/\.$/),
    }),
  );
  test("alone makes the check not met", () => {
    const marking = markAnswers(deceived, { ...plan, needs: 1 }, { ...right, "finding.verdict": "jammed" });
    expect([marking.withinCount, marking.met]).toEqual([4, false]);
  });
});

test.each([
  ["start", "12:10:30", true, null],
  ["start", "12:09:29", false, null],
  ["start", "12:14:05", false, "alarm taken for the start"],
  ["start", "12:15:00", false, "pull taken for the start"],
  ["start", "none", false, null],
  ["gainChange", "\u22125,7 dB", true, null],
  ["gainChange", "5.2", false, "sign"],
  ["gainChange", "-5.2 dBm", false, null],
  ["cn0Change", "+4", true, null],
  ["cn0Change", "-3.4", false, "sign"],
  ["cn0Change", "1e400", false, null],
  ["cn0Change", "", false, null],
])("%s %j", (quantity, typed, within, errorClass) =>
  expect(row(quantity, { [`finding.${quantity}`]: typed })).toMatchObject({ within, errorClass }),
);

describe("indications", () => {
  const marked = (first: string, second: string) =>
    rows({ "finding.first": first, "finding.second": second })
      .filter(({ quantity }) => quantity === "indications")
      .map(({ within, errorClass }) => (within ? "within" : errorClass));
  test.each([
    ["gain-down", "clock-ran", ["within", "within"]],
    ["clock-ran", "doppler-common", ["within", "not independent"]],
    ["gain-down", "gain-down", ["within", "not independent"]],
    ["gain-up", "gain-down", ["not in the log", "not independent"]],
    ["position-ran", "gain-down", ["not in the log", "within"]],
    ["", "gain-down", [null, "within"]],
    ["gain-down", "toString", ["within", null]],
  ])("%s and %s", (first, second, expected) => expect(marked(first, second)).toEqual(expected));
});
