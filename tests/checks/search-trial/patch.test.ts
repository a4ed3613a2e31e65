import { describe, expect, test } from "vitest";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { codeHarmonics } from "@/lib/gnss/codeHarmonics";
import { detectionProbability, thresholdSigma2 } from "@/lib/gnss/detection";
import type { SceneSatellite } from "@/lib/gnss/scene";
import { drawNoisePeak } from "@/lib/checks/search-trial/drawNoisePeak";
import { drawPatch, LAG_STEP_CHIPS } from "@/lib/checks/search-trial/drawPatch";
import { peakShape } from "@/lib/checks/search-trial/peakShape";
import { highestCell, meanLossDb, readPatch } from "@/lib/checks/search-trial/readPatch";
import { chiSquareSurvival } from "@/lib/numeric/chiSquare";
import { seededRandom } from "@/lib/numeric/random";
import { mean, standardDeviation } from "@/lib/numeric/statistics";
import { expectNear } from "@/tests/support/expectNear";
import { seedOf } from "../planOf";

const settings = { coherentMs: 4, sums: 20, dopplerStepHz: 125 };
const signal: SceneSatellite = {
  ...{ prn: 7, codePhaseChips: 400 * LAG_STEP_CHIPS, dopplerHz: 1250, cn0DbHz: 36 },
  ...{ carrierPhaseCycles: 0, dataBits: null, bitEdgeMs: 0 },
};
const draws = (over: Partial<SceneSatellite>, count: number) => {
  const random = seededRandom(seedOf(1), JSON.stringify(over));
  return Array.from({ length: count }, () => drawPatch({ ...signal, ...over }, settings, random));
};
const MIDDLE = 12; // of 25 cells

describe("the shape of a peak", () => {
  test("is 1 on the peak and even", () => {
    expectNear(peakShape(0), 1, 1e-12, "peak");
    expectNear(peakShape(-0.3), peakShape(0.3), 1e-15, "either side");
  });

  // The lines of the code itself up to 1 023 kHz, by the sum; random chips have that spectrum on average.
  test.each([0.1, 0.25, 0.5])("at %d chip is that of real codes, on average over 32", (offset) => {
    const shapes = Array.from({ length: 32 }, (_, n) => {
      const lines = codeHarmonics(n + 1, 1023);
      let [sum, power] = [0, 0];
      for (let k = 1; k <= 1023; k++) {
        const weight = lines[2 * k] ** 2 + lines[2 * k + 1] ** 2;
        sum += weight * Math.cos((2 * Math.PI * k * offset) / CA_LENGTH_CHIPS);
        power += weight;
      }
      return sum / power;
    });
    expectNear(peakShape(offset), mean(shapes), 0.005, "level");
  });
});

describe("cells that were drawn follow the published statistics", () => {
  test("of a signal: noncentral chi-square, at every threshold", () => {
    const rho = 10 ** 3.6 * 0.004;
    const power = draws({}, 500).map((patch) => patch.power[MIDDLE]);
    for (const level of [14, 16, 17, 18, 20]) {
      const above = power.filter((value) => value > level).length / power.length;
      // Kaplan & Hegarty (5.53); four standard errors of 500 draws at most.
      expectNear(above, detectionProbability(level * 40, 20, rho), 0.09, `above ${level}`);
    }
  });

  test("of noise: chi-square of 40 degrees", () => {
    const power = draws({ cn0DbHz: -20 }, 200).flatMap((patch) => [patch.power[0], patch.power[24]]);
    expectNear(mean(power), 1, 0.045, "mean"); // four times sqrt(1/20/400)
    for (const level of [0.8, 1, 1.3]) {
      const above = power.filter((value) => value > level).length / power.length;
      expectNear(above, chiSquareSurvival(level * 40, 40), 0.1, `above ${level}`);
    }
  });

  test("data bits cost what they cost on average", () => {
    const dataBits = Int8Array.from([1, -1, 1, -1, 1, -1, 1, -1]);
    const steady = mean(draws({ cn0DbHz: 50 }, 25).map(({ power }) => power[MIDDLE]));
    const flipping = [0, 1, 2, 3].map((bitEdgeMs) =>
      mean(draws({ cn0DbHz: 50, dataBits, bitEdgeMs }, 25).map(({ power }) => power[MIDDLE])),
    );
    // Four edges in 20 sums of 4 ms, each at its quarter of a sum: (1 - 2a)^2 of 1, 1/4, 0, 1/4 is 3/8 on average.
    expectNear(mean(flipping) / steady, 1 - (4 / 20) * (5 / 8), 0.03, "power left");
  });
});

describe("a careful reading", () => {
  const random = seededRandom(seedOf(2), "readings");
  const places = Array.from({ length: 300 }, () => ({
    ...{ codePhaseChips: 1023 * random.uniform(), dopplerHz: 8000 * (random.uniform() - 0.5), cn0DbHz: 36 },
    dataBits: Int8Array.from({ length: 8 }, () => random.pick([-1, 1])),
    bitEdgeMs: random.integer(0, 19),
  }));
  const read = places.map((place) => ({
    place,
    got: readPatch(drawPatch({ ...signal, ...place }, settings, random), 4, random),
  }));

  // Measured on 65 signals below 38 dB-Hz of generated captures, grid of 4 ms x 20 by 125 Hz, without the error of the eye:
  // Doppler 9 Hz, code phase 0.04 chip, C/N0 0.5 dB; the eye adds 12.5 Hz, 0.05 chip and 0.1 dB.
  test("is off as grids of captures show it", () => {
    const errors = (of: (one: (typeof read)[number]) => number) => standardDeviation(read.map(of));
    expectNear(
      errors(({ place, got }) => got.dopplerHz - place.dopplerHz),
      Math.hypot(9, 12.5),
      3,
      "Doppler, Hz",
    );
    const chips = ({ place, got }: (typeof read)[number]) =>
      ((got.codePhaseChips - place.codePhaseChips + 1534.5) % 1023) - 511.5;
    expectNear(errors(chips), Math.hypot(0.04, 0.05), 0.012, "code phase, chip");
    expectNear(
      errors(({ got }) => got.cn0DbHz),
      Math.hypot(0.5, 0.1),
      0.12,
      "C/N0, dB",
    );
  });

  test("has on average lost what is said to be its mean loss", () =>
    expectNear(mean(read.map(({ got }) => got.cn0DbHz)) + meanLossDb(4), 36, 0.12, "C/N0"));

  test("begins at the highest cell", () => {
    const [patch] = draws({ cn0DbHz: 50 }, 1);
    expect(highestCell(patch!)).toMatchObject({ at: MIDDLE, dopplerHz: 1250 });
  });
});

test("the highest of many noise cells stays under its median half of the time", () => {
  const random = seededRandom(seedOf(3), "noise");
  const cells = 100_000;
  const median = thresholdSigma2(1 - 0.5 ** (1 / cells), 20) / 40;
  const drawn = Array.from({ length: 200 }, () => drawNoisePeak(cells, 20, random));
  const under = drawn.filter((level) => level < median).length;
  expect(Math.abs(under - 100)).toBeLessThan(29); // four standard deviations
});
