import { describe, expect, test } from "vitest";
import type { LostDecibelsTruth } from "@/lib/checks/lost-decibels/drawCase";
import { lostDecibels as kind } from "@/lib/checks/lost-decibels/lostDecibels";
import { markAnswers } from "@/lib/checks/lost-decibels/markAnswers";
import { planOf } from "../planOf";

const plan = planOf(kind);
const log = { startUnixMs: Date.UTC(2026, 2, 14, 22, 0), intervalS: 30, readings: 1200, trackEvery: 10, passes: [] };
const base = { log, gainDb: [], currentMa: [], highDbHz: 48.2, lowDbHz: 40.1, allDbHz: 45 };

/** 6 dB between 23:00:00 and 03:00:00. */
const fault = { readings: [120, 600] as const, slow: false, depthDb: 6, gainDb: 0, currentMa: 0, sector: null };
const blockage: LostDecibelsTruth = {
  ...base,
  cause: "blockage",
  fault: { ...fault, sector: { fromDeg: 330, toDeg: 20 } },
};
const interference: LostDecibelsTruth = { ...base, cause: "interference", fault: { ...fault, gainDb: -9 } };
const water: LostDecibelsTruth = { ...base, cause: "water", fault: { ...fault, slow: true, gainDb: 8, currentMa: 4 } };
const nothing: LostDecibelsTruth = { ...base, cause: "nothing", fault: null };

const rowsOf = (truth: LostDecibelsTruth, field: string, typed: string) => {
  const [section, id] = field.split(".");
  const quantity = id.startsWith("azimuth") ? "azimuths" : id;
  const rows = markAnswers(truth, plan, { [`${section}.${id}`]: typed }).rows.filter(
    (row) => row.quantity === quantity,
  );
  return id === "azimuthTo" ? rows[1] : rows[0];
};

describe("times", () => {
  test.each([
    [blockage, "fault.start", "23:00:00", true, null],
    [blockage, "fault.start", "23:00:30", true, null],
    [blockage, "fault.start", "23:00:31", false, null],
    [blockage, "fault.start", "00:00:00", false, "local time for UTC"],
    [blockage, "fault.stop", "03:00", true, null],
    [blockage, "fault.stop", "01:00:20", false, "local time for UTC"],
    [blockage, "fault.start", "none", false, null],
    // A tenth of four hours is 24 minutes.
    [water, "fault.start", "23:24:00", true, null],
    [water, "fault.start", "22:36:00", true, null],
    [water, "fault.start", "23:45:00", false, "start read where the fall is plain"],
    [water, "fault.stop", "03:01:00", false, null],
    [nothing, "fault.start", "none", true, null],
    [nothing, "fault.stop", "23:00:00", false, null],
  ])("%#: %j", (truth, field, typed, within, errorClass) =>
    expect(rowsOf(truth, field, typed)).toMatchObject({ within, errorClass }),
  );
});

describe("azimuths", () => {
  test.each([
    [blockage, "fault.azimuthFrom", "325", true, null],
    [blockage, "fault.azimuthFrom", "\u221230", true, null],
    [blockage, "fault.azimuthFrom", "319", false, null],
    [blockage, "fault.azimuthFrom", "20", false, "edges exchanged"],
    [blockage, "fault.azimuthTo", "30 °", true, null],
    [blockage, "fault.azimuthTo", "380", false, null],
    [interference, "fault.azimuthFrom", "0", true, null],
    [interference, "fault.azimuthTo", "360", true, null],
    [interference, "fault.azimuthTo", "0", false, null],
    [nothing, "fault.azimuthTo", "0", true, null],
    [nothing, "fault.azimuthTo", "360", false, null],
    [blockage, "fault.azimuthFrom", "12 km", false, null],
  ])("%#: %j", (truth, field, typed, within, errorClass) =>
    expect(rowsOf(truth, field, typed)).toMatchObject({ within, errorClass }),
  );
});

describe("levels", () => {
  test.each([
    [interference, "fault.depth", "6", true, null],
    [interference, "fault.depth", "\u22126,4 dB", true, null],
    [interference, "fault.depth", "7.1", false, null],
    [interference, "fault.depth", "9", false, "gain control read for C/N0"],
    [nothing, "fault.depth", "0", true, null],
    [nothing, "fault.depth", "-0", true, null],
    [nothing, "fault.depth", "6", false, null],
    [nothing, "pattern.high", "48.6", true, null],
    [nothing, "pattern.high", "45", false, "all elevations taken"],
    [nothing, "pattern.low", "40,2 dB-Hz", true, null],
    [nothing, "pattern.low", "40 dB", false, null],
    [nothing, "pattern.low", "1e400", false, null],
    [nothing, "pattern.high", "NaN", false, null],
  ])("%#: %j", (truth, field, typed, within, errorClass) =>
    expect(rowsOf(truth, field, typed)).toMatchObject({ within, errorClass }),
  );
});

describe("cause", () => {
  test.each([
    [interference, "loss", "interference read as a bad antenna"],
    [water, "interference", "gain control read the wrong way round"],
    [nothing, "blockage", "elevation read as blockage"],
    [blockage, "nothing", "fault missed"],
    [blockage, "water", null],
  ])("%#: called %s", (truth, called, errorClass) => {
    const row = rowsOf(truth, "fault.cause", called);
    expect(row).toMatchObject({ within: false, critical: true, errorClass });
    expect(row.reason).toMatch(/\.$/);
  });

  test("alone makes the check not met", () => {
    const answers = {
      ...{ "fault.cause": "loss", "fault.start": "23:00:00", "fault.stop": "03:00:00", "fault.depth": "6" },
      ...{ "fault.azimuthFrom": "0", "fault.azimuthTo": "360", "fault.act": "interference" },
      ...{ "pattern.high": "48.2", "pattern.low": "40.1" },
    };
    const marking = markAnswers(interference, { ...plan, needs: 1 }, answers);
    expect(marking.withinCount).toBe(7);
    expect(marking.met).toBe(false);
    expect(markAnswers(interference, plan, { ...answers, "fault.cause": "interference" }).met).toBe(true);
  });
});
