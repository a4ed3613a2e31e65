import { describe, expect, test } from "vitest";
import { acceptedFalsePeaks, type FalseLockTruth } from "@/lib/checks/false-lock/drawScene";
import { expectedDetection } from "@/lib/checks/search-trial/expectedDetection";
import { falseLock as kind } from "@/lib/checks/false-lock/falseLock";
import { publicCase } from "@/lib/checks/false-lock/publicCase";
import { REFERENCE_SEARCH } from "@/lib/checks/false-lock/referenceSearch";
import { falsePeaks } from "@/lib/gnss/falseLock";
import { planOf, seeds } from "../planOf";
import { sceneFor } from "./sceneFor";

const SLOW = 120_000;
const drawn = seeds(20).map((seed) => ({ seed, ...sceneFor(seed) }));
const signalOf = ({ scene }: FalseLockTruth, prn: number) =>
  scene.satellites.find((satellite) => satellite.prn === prn);

/** Chip by chip, by the engine: what the strong satellite does to the search for another one. */
const peaksThrough = (truth: FalseLockTruth, prn: number) => {
  const parent = signalOf(truth, truth.parentPrn);
  if (!parent) throw new Error("the strong satellite is in every scene");
  return falsePeaks({
    parentPrn: parent.prn,
    victimPrn: prn,
    parentDopplerHz: parent.dopplerHz,
    parentCn0DbHz: parent.cn0DbHz,
    coherentMs: 10,
    sums: 10,
    dopplerHalfWidthHz: 6000,
  }).map((peak) => ({ ...peak, codePhaseChips: (parent.codePhaseChips + peak.lagChips) % 1023 }));
};

test("one strong satellite, four to seven others, and a weak one in about half of the scenes", () => {
  const weak = drawn.filter(({ truth }) => signalOf(truth, truth.weakPrn)).length;
  expect(weak).toBeGreaterThanOrEqual(4); // 10 +- 2.2 expected of 20 (binomial)
  expect(weak).toBeLessThanOrEqual(16);
  for (const { truth } of drawn) {
    const levels = truth.scene.satellites.filter(({ prn }) => prn !== truth.weakPrn).map(({ cn0DbHz }) => cn0DbHz);
    const [strongest, ...others] = levels.sort((a, b) => b - a);
    expect(strongest >= 50 && strongest <= 53).toBe(true);
    expect(others.length >= 4 && others.length <= 7).toBe(true);
    expect(others.every((level) => level >= 38 && level <= 44)).toBe(true);
    const weakLevel = signalOf(truth, truth.weakPrn)?.cn0DbHz ?? 30;
    expect(weakLevel >= 29 && weakLevel <= 33).toBe(true);
  }
});

test(
  "the reported satellite is not in the capture; its code meets the strong one's at -21 to -22 dB",
  { timeout: SLOW },
  () => {
    for (const { truth } of drawn) {
      expect(signalOf(truth, truth.victimPrn)).toBeUndefined();
      const [worst] = peaksThrough(truth, truth.victimPrn);
      expect(worst.levelDb >= -22 && worst.levelDb <= -21).toBe(true);
    }
  },
);

describe("scenes that are refused", () => {
  test("are counted", () => expect(Math.max(...drawn.map(({ draws }) => draws))).toBeGreaterThan(1));

  test(
    "have a genuine peak that shares a bin and two chips with a false one; what is left has none",
    { timeout: SLOW },
    () => {
      for (const { truth } of drawn.slice(0, 8)) {
        for (const { prn, dopplerHz, codePhaseChips } of truth.scene.satellites) {
          if (prn === truth.parentPrn) continue;
          const shared = peaksThrough(truth, prn).filter((peak) => {
            const apart = Math.abs(peak.codePhaseChips - codePhaseChips);
            return Math.abs(peak.dopplerHz - dopplerHz) < 100 && Math.min(apart, 1023 - apart) <= 2;
          });
          expect(shared).toEqual([]);
        }
      }
    },
  );

  test("have a weak satellite that the search would miss; what is left has none", () => {
    for (const { truth } of drawn) {
      const weak = signalOf(truth, truth.weakPrn);
      if (weak) expect(expectedDetection(weak, REFERENCE_SEARCH)).toBeGreaterThanOrEqual(0.99);
    }
  });
});

test("several false peaks count, all at the strong satellite's Doppler plus or minus whole kHz", () => {
  for (const { truth } of drawn) {
    const accepted = acceptedFalsePeaks(truth);
    const parentHz = signalOf(truth, truth.parentPrn)?.dopplerHz ?? NaN;
    expect(accepted.length).toBeGreaterThan(1);
    for (const { dopplerHz, levelDb } of accepted) {
      const lines = (dopplerHz - parentHz) / 1000;
      expect(Math.abs(lines - Math.round(lines))).toBeLessThan(1e-9);
      expect(Math.abs(dopplerHz)).toBeLessThanOrEqual(6000);
      expect(levelDb).toBeGreaterThanOrEqual(accepted[0].levelDb - 1);
    }
  }
});

test("behind the wall stand the reported one and one more, every other in open sky", () => {
  for (const { truth } of drawn) {
    const { fromAzimuthDeg, toAzimuthDeg, topElevationDeg } = truth.wall;
    const span = (toAzimuthDeg - fromAzimuthDeg + 360) % 360;
    const behind = truth.listed.filter(
      ({ azimuthDeg, elevationDeg }) =>
        (azimuthDeg - fromAzimuthDeg + 360) % 360 <= span && elevationDeg <= topElevationDeg,
    );
    expect(behind).toHaveLength(2);
    expect(behind.map(({ verdict }) => verdict).sort()).toEqual(["absent", "cross-correlation"]);
    expect(behind.filter(({ reportedCn0DbHz }) => reportedCn0DbHz !== null).map(({ prn }) => prn)).toEqual([
      truth.victimPrn,
    ]);
  }
});

test("the false lock is reported at about what the two codes give", () => {
  for (const { truth } of drawn) {
    const victim = truth.listed.find(({ prn }) => prn === truth.victimPrn);
    expect(Math.abs((victim?.reportedCn0DbHz ?? NaN) - truth.falsePeaks[0].apparentCn0DbHz)).toBeLessThanOrEqual(1.2);
  }
});

describe("the public case", () => {
  const plan = planOf(kind);

  test("is the same, byte for byte, whether the weak satellite is in the capture or not", { timeout: SLOW }, () => {
    for (const { seed } of drawn.slice(0, 8)) {
      const [without, withIt] = [0, 100].map((decoy) => sceneFor(seed, { decoy }).truth);
      expect(without.scene.satellites.length).toBe(withIt.scene.satellites.length - 1);
      expect(JSON.stringify(publicCase(without, plan))).toBe(JSON.stringify(publicCase(withIt, plan)));
    }
  });

  test("holds these data and no other", () => {
    const { data } = publicCase(drawn[0].truth, plan);
    expect(Object.keys(data).sort()).toEqual([
      "captureFile",
      "rateHz",
      "report",
      "samples",
      "search",
      "sky",
      "wall",
      "weakestDbHz",
    ]);
    expect(Object.keys((data.sky as object[])[0]).sort()).toEqual(["azimuthDeg", "elevationDeg", "prn"]);
    expect(Object.keys((data.report as object[])[0]).sort()).toEqual(["cn0DbHz", "prn", "tracked"]);
  });
});
