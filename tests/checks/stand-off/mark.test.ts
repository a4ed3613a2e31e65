import { describe, expect, test } from "vitest";
import type { Answers } from "@/lib/checks/kind";
import type { StandOffTruth } from "@/lib/checks/stand-off/drawCase";
import { markAnswers } from "@/lib/checks/stand-off/markAnswers";
import { standOff as kind } from "@/lib/checks/stand-off/standOff";
import { interferenceDbm, recoveryM, type StandOffSite } from "@/lib/checks/stand-off/standOffOf";
import { planOf } from "../planOf";

const plan = planOf(kind);

/** 10 mW behind 12 dB at exponent 3, -5 dB of antenna; 300 m: 10 - 5 - 36.396 - 74.314 - 12 = -117.7 dBm, by hand. */
const site: StandOffSite = {
  eirpMw: 10,
  distanceM: 300,
  exponent: 3,
  screenDb: 12,
  antennaGainDb: -5,
  noiseDensityDbmHz: -172,
  thresholdDbHz: 40,
  satellites: [45, 44, 47, 42, 49].map((cn0DbHz, n) => ({ prn: n + 1, elevationDeg: 40, cn0DbHz })),
};
const truth: StandOffTruth = {
  site,
  type: "carrier",
  receivedDbm: interferenceDbm(site),
  // By hand at J = -117.71 dBm: 1/(1/(C/N0) + 10^((J + 172)/10)/1.023e6 / (C/N0)) with J/N0 = 54.29 dB-Hz, 0.2625 of Rc.
  effectiveDbHz: [45, 44, 47, 42, 49].map((cn0) => cn0 - 1.012),
  recoveryM: recoveryM(site, 1, 44),
};
const good: Answers = {
  "interference.received": "-117.7",
  "effective.prn1": "44.0",
  "effective.prn2": "43.0",
  "effective.prn3": "46.0",
  "effective.prn4": "41.0",
  "effective.prn5": "48.0",
  "receiver.usable": "5",
  "receiver.recovery": String(truth.recoveryM),
};
const rows = (answers: Answers) => markAnswers(truth, plan, { ...good, ...answers }).rows;
const row = (quantity: string, answers: Answers, subject: string | null = null) =>
  rows(answers).find((one) => one.quantity === quantity && (subject === null || one.subject === subject));

test("worked by hand is met", () => expect(rows({}).filter(({ within }) => !within)).toEqual([]));

describe("level", () => {
  test.each<[string, boolean, string | null]>([
    ["-117.7 dBm", true, null],
    ["\u2212147.7 dBW", true, null],
    ["\u2212118,6", true, null],
    ["-118.8", false, null],
    ["-112.7", false, "antenna gain forgotten"],
    ["-107.7", false, "sign of the antenna gain"],
    ["117.7", false, "sign"],
    // 10 - 5 - 36.396 - 49.542 - 12: free space at 300 m, by hand.
    ["-92.9", false, "free space for the path given"],
    ["-117.7 dB", false, null],
  ])("%s", (typed, within, errorClass) =>
    expect(row("received", { "interference.received": typed })).toMatchObject({ within, errorClass }),
  );
});

describe("effective C/N0", () => {
  test("follows the candidate's own level", () => {
    // At J/N0 of 70 dB-Hz, 10 dB over the chip rate's 60.1: 45 - 10.3 = 34.7 dB-Hz (by hand).
    const own = { "interference.received": "-102", "effective.prn1": "34.7" };
    expect(row("received", own)?.within).toBe(false);
    expect(row("effective", own, "PRN 1")?.within).toBe(true);
    expect(row("effective", { "interference.received": "?" }, "PRN 1")?.within).toBe(true);
  });
  test.each<[string, string, string | null]>([
    // By hand: J/S 25 dB as 20 log is 17.78; -10 log (10^-4.5 + 17.78/1.023e6) = 43.1 dB-Hz.
    ["-102", "43.1", "J/S in volts"],
    ["-102", "37.9", "wrong Q"],
    ["-102", "30", null],
  ])("at %s dBm, %s: %s", (received, typed, errorClass) =>
    expect(row("effective", { "interference.received": received, "effective.prn1": typed }, "PRN 1")).toMatchObject({
      within: false,
      errorClass,
    }),
  );
});

describe("count", () => {
  test("of the candidate's own values", () => {
    const own = { "effective.prn4": "39.9", "effective.prn2": "39.9" };
    expect(row("usable", { ...own, "receiver.usable": "3" })?.within).toBe(true);
    expect(row("usable", { ...own, "receiver.usable": "5" })?.reason).toMatch(/^By your own values 3 of 5/);
  });
  test("a part of a satellite is none", () => expect(row("usable", { "receiver.usable": "4.9" })?.within).toBe(false));
});

describe("distance of recovery", () => {
  const times = (factor: number) => String(truth.recoveryM * factor);
  test.each<[string, boolean, string | null]>([
    [times(1.11), true, null],
    [`${truth.recoveryM / 1000} km`, true, null],
    [times(1.13), false, null],
    // 5 dB at exponent 3 are a factor of 10^(5/30) = 1.468.
    [times(1.468), false, "antenna gain forgotten"],
    // 3.464 dB of Q, 10^(-3.464/30) = 0.767.
    [times(0.767), false, "wrong Q"],
    ["0", false, null],
    ["-300", false, null],
  ])("%s m", (typed, within, errorClass) =>
    expect(row("recovery", { "receiver.recovery": typed })).toMatchObject({ within, errorClass }),
  );
  test("of another satellite than the fourth is named", () => {
    expect(row("recovery", { "receiver.recovery": String(recoveryM(site, 1, 49)) })?.errorClass).toBe(
      "strongest satellite",
    );
    expect(row("recovery", { "receiver.recovery": String(recoveryM(site, 1, 42)) })?.errorClass).toBe(
      "weakest satellite",
    );
  });
});
