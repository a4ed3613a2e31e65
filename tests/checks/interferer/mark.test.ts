import { describe, expect, test } from "vitest";
import type { InterfererTruth } from "@/lib/checks/interferer/drawCase";
import { interferer as kind } from "@/lib/checks/interferer/interferer";
import { markAnswers } from "@/lib/checks/interferer/markAnswers";
import type { Answers } from "@/lib/checks/kind";
import { planOf } from "../planOf";

const plan = planOf(kind);
const reading = {
  class: "pulse",
  centreHz: 0,
  bandwidthHz: 0,
  periodS: 0,
  levelDb: 0,
  floorDb: 0,
  ownLineDb: 0,
} as const;
/** Pulses of 10 us every 200 us, 400 kHz below the centre, 15 dB over a floor of -36.13 dB in 1 MHz (3.9303 over 127²). */
const truth: InterfererTruth = {
  durationMs: 10,
  startedAt: "2026-03-01T10:00:00.000Z",
  reading,
  scene: {
    class: "pulse",
    interferer: { kind: "pulse", power: 2500, offsetHz: -400_000, periodS: 200e-6, onShare: 0.05 },
    sigma: 4,
    offsetI: 2,
    offsetQ: 0,
    imageShare: 0.03,
    figures: { centreHz: -400_000, bandwidthHz: 120_000, periodS: 200e-6, levelDb: 15 },
    floorPerHz: 3.9303e-6,
    ownLineDb: 2,
  },
};
const good: Answers = {
  "interference.class": "pulse",
  "interference.centre": "-400",
  "interference.bandwidth": "120",
  "interference.period": "200",
  "interference.level": "15",
  "receiver.floor": "-36.1",
  "receiver.ownLine": "2",
};
const row = (quantity: string, answers: Answers, of: InterfererTruth = truth) =>
  markAnswers(of, plan, { ...good, ...answers }).rows.find((one) => one.quantity === quantity)!;

test("worked by hand is met", () => expect(markAnswers(truth, plan, good).met).toBe(true));

describe("class is critical", () => {
  test("another one fails the check alone", () => {
    const marking = markAnswers(truth, { ...plan, needs: 1 }, { ...good, "interference.class": "sweep" });
    expect(marking.met).toBe(false);
  });
  test.each([
    ["nothing", "interference missed"],
    ["sweep", null],
    ["", null],
    ["Pulses", null],
  ])("%j", (typed, errorClass) =>
    expect(row("class", { "interference.class": typed })).toMatchObject({ within: false, critical: true, errorClass }),
  );
  test("a carrier at 0 Hz is the receiver's own line", () => {
    const own = { "interference.class": "carrier", "interference.centre": "0" };
    expect(row("class", own).errorClass).toBe("own line called a carrier");
  });
});

describe("figures", () => {
  test.each<[string, string, boolean, string | null]>([
    ["centre", "\u22120.41 MHz", true, null],
    ["centre", "-410.1", false, null],
    ["centre", "400", false, "mirror image"],
    ["centre", "0", false, "own line"],
    ["centre", "-400000", false, "Hz for kHz"],
    ["bandwidth", "144", true, null],
    ["bandwidth", "145", false, null],
    ["bandwidth", "60", false, "half of the width"],
    ["period", "0.209 ms", true, null],
    ["period", "211", false, null],
    ["period", "400", false, "more than one repetition"],
    ["period", "100", false, "half of a repetition"],
    ["period", "5", false, "rate for time"],
    ["period", "0", false, null],
    ["level", "16.5", true, null],
    ["level", "16.6", false, null],
    // 10 log 0.05 = -13.01 dB: the level while on, by hand.
    ["level", "28", false, "level while on"],
    // 10 log 8.184 = 9.13 dB, by hand.
    ["level", "5.9", false, "noise of the whole band"],
  ])("%s %s", (quantity, typed, within, errorClass) =>
    expect(row(quantity, { [`interference.${quantity}`]: typed })).toMatchObject({ within, errorClass }),
  );
  test.each<[string, string, boolean, string | null]>([
    ["floor", "-37", true, null],
    ["floor", "-37.2", false, null],
    ["floor", "36.1", false, "sign"],
    ["floor", "-27", false, "noise of the whole band"],
    ["ownLine", "3.5 dB", true, null],
    ["ownLine", "3.6", false, null],
    ["ownLine", "2 dBm", false, null],
  ])("%s %s", (quantity, typed, within, errorClass) =>
    expect(row(quantity, { [`receiver.${quantity}`]: typed })).toMatchObject({ within, errorClass }),
  );

  test("something wide is given 2 % of its width", () => {
    const figures = { ...truth.scene.figures, bandwidthHz: 2e6 };
    const wide = { ...truth, scene: { ...truth.scene, figures } };
    expect(row("centre", { "interference.centre": "-439" }, wide).within).toBe(true);
    expect(row("centre", { "interference.centre": "-441" }, wide).within).toBe(false);
  });
});

describe("nothing there", () => {
  const figures = { centreHz: 0, bandwidthHz: 0, periodS: 0, levelDb: 0 };
  const none = { ...truth, scene: { ...truth.scene, class: "nothing" as const, interferer: null, figures } };
  const zeros: Answers = {
    ...good,
    "interference.class": "nothing",
    ...Object.fromEntries(["centre", "bandwidth", "period", "level"].map((id) => [`interference.${id}`, "0"])),
  };
  test("is zeros, floor and own line", () => expect(markAnswers(none, plan, zeros).met).toBe(true));
  test("is not met by saying so", () => {
    for (const field of ["receiver.floor", "receiver.ownLine"])
      for (const typed of ["", "0", "-20"])
        expect(markAnswers(none, plan, { ...zeros, [field]: typed }).met).toBe(false);
  });
  test("with the own line called a carrier", () =>
    expect(row("class", { "interference.class": "carrier" }, none).errorClass).toBe("own line called a carrier"));
});

test("a single carrier has no width: what the resolution shows of it is allowed", () => {
  const figures = { centreHz: -4e5, bandwidthHz: 0, periodS: 0, levelDb: 15 };
  const tone = { ...truth, scene: { ...truth.scene, class: "carrier" as const, figures } };
  expect(row("bandwidth", { "interference.bandwidth": "2" }, tone).within).toBe(true);
  expect(row("bandwidth", { "interference.bandwidth": "11" }, tone).within).toBe(false);
  expect(row("period", { "interference.period": "0" }, tone).within).toBe(true);
  expect(row("period", { "interference.period": "1000" }, tone).within).toBe(false);
});
