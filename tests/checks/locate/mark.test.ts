import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import { locate as kind } from "@/lib/checks/locate/locate";
import { markAnswers } from "@/lib/checks/locate/markAnswers";
import { errorEllipse } from "@/lib/gnss/interference/bearingFix";
import { fixWith } from "@/lib/checks/locate/findReflection";
import { placeByLevel } from "@/lib/checks/locate/placeByLevel";
import { expectNear } from "@/tests/support/expectNear";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);
const built = kind.build(seedOf(11), plan);
const { truth } = built;
const right = kind.solve(built, plan);
const row = (quantity: string, answers: Answers) =>
  markAnswers(truth, plan, { ...right, ...answers }).rows.find((one) => one.quantity === quantity)!;
const { transmitter, ellipse } = truth;
/** A circle about a place so far from the transmitter. */
const circle = (offM: number, radiusM: number): Answers => ({
  "fix.east": String(transmitter.eastM + offM),
  "fix.north": String(transmitter.northM),
  "fix.major": String(radiusM),
  "fix.minor": String(radiusM),
  "fix.azimuth": "0",
});

describe("inside their own ellipse", () => {
  // By hand: a circle of 20 m about a place 19.9 m off holds the transmitter, one 20.1 m off does not.
  test.each([
    [0, true],
    [19.9, true],
    [20.1, false],
    [-20.1, false],
  ])("circle of 20 m, %d m off", (offM, within) => expect(row("position", circle(offM, 20)).within).toBe(within));

  test("an ellipse is turned by its direction, either way round", () => {
    const long = { ...circle(80, 100), "fix.minor": "10" };
    expect(row("position", { ...long, "fix.azimuth": "90" }).within).toBe(true);
    expect(row("position", { ...long, "fix.azimuth": "270°" }).within).toBe(true);
    expect(row("position", { ...long, "fix.azimuth": "0" }).within).toBe(false);
  });

  test("kilometres are understood", () =>
    expect(row("position", { ...circle(0, 20), "fix.east": `${transmitter.eastM / 1000} km` }).within).toBe(true));

  test("where all bearings meet is the reflection averaged in", () => {
    const all = errorEllipse(fixWith(truth.log)!, 0.95);
    const there = { "fix.east": String(all.eastM), "fix.north": String(all.northM) };
    expect(row("position", there)).toMatchObject({ within: false, errorClass: "reflection averaged in" });
  });

  test("where the strongest level puts it is named", () => {
    const place = placeByLevel(truth.log);
    const there = { "fix.east": String(place.eastM), "fix.north": String(place.northM) };
    expect(row("position", there)).toMatchObject({ within: false, errorClass: "level taken as distance" });
  });
});

// Free-space loss of 46 dB more than at 1 m is a distance of 200 m (20 log 200 = 46.02, textbook); 10 dBm - 36.4 - 46 dB.
test("a level as a distance", () => {
  const log = [
    { stop: 1, timeUtc: "10:00", eastM: 100, northM: 50, bearingDeg: 90, spreadDeg: 3, levelDbm: -72.42 },
    { stop: 2, timeUtc: "10:05", eastM: 0, northM: 0, bearingDeg: 0, spreadDeg: 3, levelDbm: -90 },
    { stop: 3, timeUtc: "10:09", eastM: 0, northM: 0, bearingDeg: null, spreadDeg: null, levelDbm: null },
  ];
  const place = placeByLevel(log);
  expectNear(place.eastM, 300, 0.2, "east, m");
  expectNear(place.northM, 50, 1e-6, "north, m");
});

describe("area", () => {
  const times = (factor: number): Answers => ({
    "fix.major": String(ellipse.semiMajorM * factor),
    "fix.minor": String(ellipse.semiMinorM),
  });
  test.each([
    [0.1, true],
    [1.99, true],
    [2.01, false],
  ])("%d times the least", (factor, within) => {
    const marked = row("area", times(factor));
    expect(marked.within).toBe(within);
    expect(marked.errorClass).toBe(within ? null : "too wide");
    expect(marked.difference).toBe(`×\u00a0${factor.toFixed(2)}`);
  });
  test("a lead may allow more", () => {
    const wide = {
      ...plan,
      quantities: [{ of: "area", tolerance: { value: 3, unit: "1" as const }, critical: false }],
    };
    expect(markAnswers(truth, wide, { ...right, ...times(2.9) }).met).toBe(true);
  });
});

describe("an ellipse that cannot be drawn", () => {
  test.each([
    ["fix.east", "", "East: Nothing was handed in."],
    ["fix.major", "0", /^Long half axis: from 0\.1/],
    ["fix.minor", "-5", /^Short half axis: from 0\.1/],
    ["fix.azimuth", "NaN", /^Direction: /],
    ["fix.north", "5 Hz", /^North: .*does not fit/],
  ])("%s of %j", (field, typed, reason) => {
    for (const quantity of ["position", "area"]) {
      const marked = row(quantity, { [field]: typed });
      expect(marked).toMatchObject({ within: false, difference: null });
      expect(marked.reason).toMatch(reason);
    }
  });
  test("nothing at all", () => {
    const none = Object.fromEntries(Object.keys(right).map((id) => [id, ""]));
    const marking = markAnswers(truth, plan, none);
    expect(marking.withinCount).toBe(0);
    for (const { reason } of marking.rows) expect(reason).toBe("Nothing was handed in.");
  });
});

describe("report", () => {
  test("what is done there is critical", () => {
    const marking = markAnswers(truth, { ...plan, needs: 1 }, { ...right, "report.action": "take" });
    expect(marking.met).toBe(false);
    expect(row("action", { "report.action": "take" })).toMatchObject({ critical: true, errorClass: "unsafe act" });
  });
  test.each(["1", "2", "3", "9.5", "none"])("of the stops only one is right: %s", (typed) =>
    expect(row("reflection", { "report.reflection": typed }).within).toBe(Number(typed) === truth.reflectionStop),
  );
  // IS-GPS-200, 3.3.1.1: L1 1575.42 MHz, L2 1227.60 MHz; IS-GPS-705, 3.3.1.1: L5 1176.45 MHz.
  test.each([
    [1575.42, "L1"],
    [1227.6, "L2"],
    [1176.45, "L5"],
  ])("%d MHz is %s", (frequencyMhz, band) => {
    const shown = { ...built.publicCase, data: { ...built.publicCase.data, frequencyMhz } };
    expect(kind.solve({ ...built, publicCase: shown }, plan)["report.band"]).toBe(band);
  });
});
