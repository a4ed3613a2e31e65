import { describe, expect, test } from "vitest";
import { analyse } from "@/lib/checks/interferer/analyse";
import type { InterfererScene } from "@/lib/checks/interferer/drawScene";
import { makeCapture } from "@/lib/checks/interferer/makeCapture";
import type { Interferer } from "@/lib/gnss/interference/interferer";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const SIGMA = 4;
// Noise of 4 counts in I and Q: 2 (16 + 1/12) over 8.184 MHz is 3.9303 in 1 MHz, by hand; 127² is 0 dB.

/** A scene of the receiver's noise, a line at 0 Hz of 2 counts in I, a mirrored share of 3 %, and an interferer. */
const read = (interferer: Interferer | null) => {
  const scene = { sigma: SIGMA, offsetI: 2, offsetQ: 0, imageShare: 0.03, interferer } as InterfererScene;
  return analyse(makeCapture(scene, 10, seededRandom("1".repeat(64), "noise")));
};

describe("the receiver itself", () => {
  const reading = read(null);
  test("is nothing", () =>
    expect(reading).toMatchObject({ class: "nothing", centreHz: 0, bandwidthHz: 0, levelDb: 0 }));
  // 10 log(3.9303/16129) and 10 log(2²/3.9303), by hand.
  test("floor against full scale", () => expectNear(reading.floorDb, -36.13, 0.2, "floor, dB"));
  test("own line over the floor", () => expectNear(reading.ownLineDb, 0.08, 0.25, "own line, dB"));
});

describe("what was put in is read", () => {
  // Level: mean power over 3.9303, by hand; bandwidths at 6 dB by their formulas: sinc² 1.207 over the pulse or the chip,
  // width of the sweep, twelve-pole edges 4.6 % wider, twice deviation and modulation (Carson).
  type Case = [
    cls: string,
    interferer: Interferer,
    read: { centreKhz: number; widthKhz: number; periodUs: number; levelDb: number },
  ];
  const CASES: Case[] = [
    [
      "carrier",
      { kind: "tone", power: 400, offsetHz: -700_000, phaseCycles: 0.1 },
      { centreKhz: -700, widthKhz: 0, periodUs: 0, levelDb: 20.08 },
    ],
    [
      "narrow-fm",
      { kind: "narrow-fm", power: 400, offsetHz: 300_000, deviationHz: 40_000, modulationHz: 2000 },
      { centreKhz: 300, widthKhz: 84, periodUs: 500, levelDb: 20.08 },
    ],
    [
      "sweep",
      { kind: "sweep", power: 900, offsetHz: 500_000, widthHz: 1.5e6, periodS: 40e-6, shape: "saw" },
      { centreKhz: 500, widthKhz: 1500, periodUs: 40, levelDb: 23.6 },
    ],
    [
      "pulse",
      { kind: "pulse", power: 2500, offsetHz: 400_000, periodS: 200e-6, onShare: 0.05 },
      { centreKhz: 400, widthKhz: 120.7, periodUs: 200, levelDb: 15.02 },
    ],
    [
      "noise",
      { kind: "noise", power: 400, offsetHz: -600_000, widthHz: 1e6 },
      { centreKhz: -600, widthKhz: 1046, periodUs: 0, levelDb: 20.08 },
    ],
    [
      "code",
      { kind: "matched-code", power: 160, prn: 7, codePhaseChips: 11, dopplerHz: 40_000 },
      { centreKhz: 40, widthKhz: 1234, periodUs: 1000, levelDb: 16.1 },
    ],
  ];
  test.each(CASES)("%s", (cls, interferer, { centreKhz, widthKhz, periodUs, levelDb }) => {
    const reading = read(interferer);
    expect(reading.class).toBe(cls);
    expectNear(reading.centreHz / 1000, centreKhz, Math.max(3, 0.01 * widthKhz), "centre, kHz");
    expectNear(reading.bandwidthHz / 1000, widthKhz, 0.12 * widthKhz, "bandwidth, kHz");
    expectNear(reading.periodS * 1e6, periodUs, 0.005 * periodUs, "repetition, us");
    expectNear(reading.levelDb, levelDb, 0.5, "level, dB");
    expectNear(reading.floorDb, -36.13, 0.4, "floor, dB");
  });
});
