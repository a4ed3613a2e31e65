import { describe, expect, test } from "vitest";
import {
  decidingCn0DbHz,
  effectiveOf,
  interferenceDbm,
  jsDb,
  recoveryM,
  type StandOffSite,
} from "@/lib/checks/stand-off/standOffOf";
import { expectNear } from "@/tests/support/expectNear";

/** 10 mW in free space at 1 km, an isotropic antenna; satellites at -128.5 dBm have 44 dB-Hz. */
const site: StandOffSite = {
  eirpMw: 10,
  distanceM: 1000,
  exponent: 2,
  screenDb: 0,
  antennaGainDb: 0,
  noiseDensityDbmHz: -172.5,
  thresholdDbHz: 28,
  satellites: [41, 44, 47, 45, 43].map((cn0DbHz, n) => ({ prn: n + 1, elevationDeg: 40, cn0DbHz })),
};

// Free-space loss is 20 log(4 pi d f/c), 96.40 dB at 1 km on L1 (textbook): 10 dBm - 96.4 dB = -86.4 dBm, J/S 42.1 dB.
test("10 mW at 1 km", () => {
  expectNear(interferenceDbm(site), -86.396, 0.005, "level, dBm");
  expectNear(jsDb(site, interferenceDbm(site), 44), 42.104, 0.005, "J/S, dB");
});

// By hand: 96.396 + 10 (3 - 2) log(1000) = 126.396 dB, 12 dB of screen, -5 dB of antenna.
test("exponent, screen and antenna gain", () => {
  const walled = { ...site, exponent: 3, screenDb: 12, antennaGainDb: -5 };
  expectNear(interferenceDbm(walled), 10 - 5 - 126.396 - 12, 0.005, "level, dBm");
});

describe("what is left of 44 dB-Hz at J/S 30 dB", () => {
  // Worked out by an independent program before this code was written, to a tenth of a dB.
  test.each([
    [1, 29.9],
    [1.5, 31.6],
    [2.22, 33.2],
  ])("Q %d", (q, expected) => expectNear(effectiveOf(site, -98.5, q, 44), expected, 0.06, "effective, dB-Hz"));

  // Kaplan & Hegarty, "Understanding GPS", 2nd edition, chapter 6, worked to four figures: 45 dB-Hz, 30 dB, Q 1.
  test("45 dB-Hz", () => expectNear(effectiveOf(site, -97.5, 1, 45), 29.9605, 0.0005, "effective, dB-Hz"));
});

describe("recovery", () => {
  // Same source: J/S tolerated from 45 to 28 dB-Hz at Q 1 is 32.0112 dB, so J = -127.5 + 32.0112 dBm. By hand
  // d = 10^((10 - 36.396 + 95.4888)/20) m.
  test("distance at which 45 dB-Hz is 28 dB-Hz", () => expectNear(recoveryM(site, 1, 45), 2848, 3, "distance, m"));

  test("leaves just the threshold", () => {
    const there = { ...site, distanceM: recoveryM(site, 1.5, 43) };
    expectNear(effectiveOf(there, interferenceDbm(there), 1.5, 43), 28, 1e-9, "effective, dB-Hz");
  });

  test("the fourth strongest decides", () => expect(decidingCn0DbHz(site)).toBe(43));
});
