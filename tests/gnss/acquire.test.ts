import { describe, expect, test } from "vitest";
import { acquire, searchGrid, type SearchSettings } from "@/lib/gnss/acquire";
import { codeHarmonics } from "@/lib/gnss/codeHarmonics";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { chiSquareInverseSurvival } from "@/lib/numeric/chiSquare";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";
import { sceneOf } from "./sceneOf";

/**
 * 4 ms x 20 with bins of 2/(3T). The false alarms are set low because the codes of other satellites are not noise: two at
 * 42 dB-Hz leave peaks of 21 dB-Hz, which a threshold for 1e-3 meets now and then.
 */
const plan: SearchSettings = {
  coherentMs: 4,
  sums: 20,
  dopplerHalfWidthHz: 9000,
  dopplerStepHz: 500 / 3,
  falseAlarmPerSearch: 1e-6,
};
const around = (chips: number) => chips - 1023 * Math.round(chips / 1023);

describe.each([
  ["2.046 MHz", "11".repeat(32), 2.046e6, [2, 5, 9, 17, 26, 30], 0, 4200],
  ["4.092 MHz, clock 1 ppm off", "22".repeat(32), 4.092e6, [1, 8, 11, 18, 22, 32], 1575, 5700],
  ["2.048 MHz, clock 7 ppm off", "33".repeat(32), 2.048e6, [4, 7, 10, 16, 20], -11_000, 15_000],
])("a sky at %s", (_name, seed, rateHz, present, commonOffsetHz, dopplerHalfWidthHz) => {
  const scene = sceneOf(seed, rateHz, present, commonOffsetHz);
  const { samples } = synthesizeCi8(scene, seededRandom(seed, "noise"));
  const absent = [14, 15, 24];
  const searches = acquire({ samples, rateHz }, { ...plan, dopplerHalfWidthHz, prns: [...present, ...absent] });

  test("answers for every satellite asked, in order", () =>
    expect(searches.map(({ prn }) => prn)).toEqual([...present, ...absent]));

  test("invents none", () => {
    for (const search of searches.slice(present.length)) expect(search.found, `PRN ${search.prn}`).toBe(false);
  });

  test.each(scene.satellites.map((satellite, n) => [satellite.prn, satellite, searches[n]] as const))(
    "finds PRN %i within 0.15 chip, 30 Hz and 1.5 dB",
    (_prn, truth, search) => {
      // All of these are above 34 dB-Hz; the plan misses fewer than one in a thousand there.
      expect(search.found).toBe(true);
      expect(search.peak).toBeGreaterThan(search.threshold);
      expect(search.codePhaseChips >= 0 && search.codePhaseChips < 1023).toBe(true);
      expectNear(around(search.codePhaseChips - truth.codePhaseChips), 0, 0.15, "code phase in chips");
      expectNear(search.dopplerHz, truth.dopplerHz, 30, "Doppler in Hz");
      expectNear(search.cn0DbHz, truth.cn0DbHz, 1.5, "C/N0 in dB-Hz");
    },
  );

  test("reads the noise: 24 counts per component, and the other satellites' few per cent on top", () => {
    for (const { noise } of searches) {
      expect(noise).toBeGreaterThan(2 * 24 * 24 * 0.99);
      expect(noise).toBeLessThan(2 * 24 * 24 * 1.08);
    }
  });
});

describe("noise alone", () => {
  const rateHz = 2.046e6;
  const { samples } = synthesizeCi8(
    { rateHz, durationMs: 20, ifHz: 0, satellites: [] },
    seededRandom("55".repeat(32), "noise"),
  );
  const settings = { ...plan, coherentMs: 1, dopplerHalfWidthHz: 8000, dopplerStepHz: 500 };

  test("fills the grid as the chi-square law of 2K degrees says", () => {
    const { power, dopplersHz, lagsChips } = searchGrid({ samples, rateHz }, 12, settings);
    expect(dopplersHz).toHaveLength(33);
    expect([dopplersHz[0], dopplersHz[16], dopplersHz[32]]).toEqual([-8000, 0, 8000]);
    expect(lagsChips).toHaveLength(2048);
    expect(power).toHaveLength(33 * 2048);
    let [sum, squares] = [0, 0];
    power.forEach((value) => {
      sum += value;
      squares += value * value;
    });
    const mean = sum / power.length;
    expectNear(mean, 1, 0.01, "mean");
    // A sum of 20 powers scatters by 1/sqrt 20. Cells share noise with their neighbours, about one in three is independent.
    expectNear(Math.sqrt(squares / power.length - mean * mean), 1 / Math.sqrt(20), 0.01, "deviation");
    for (const p of [0.1, 0.01, 0.001]) {
      const level = chiSquareInverseSurvival(p, 40) / 40;
      const above = power.reduce((count, value) => count + (value > level ? 1 : 0), 0);
      expectNear(above, p * power.length, 5 * Math.sqrt(3 * p * power.length), `cells above the ${p} level`);
    }
  });

  test("passes no threshold", () => {
    const prns = [1, 7, 12, 25];
    for (const search of acquire({ samples, rateHz }, { ...settings, falseAlarmPerSearch: 1e-3, prns })) {
      expect(search.found).toBe(false);
      expect(search.peak).toBeGreaterThan(1.5); // the highest of 67,000 cells
    }
  });

  test("the threshold is the chi-square point for the whole grid", () => {
    const { threshold } = searchGrid({ samples, rateHz }, 12, settings);
    expectNear(threshold, chiSquareInverseSurvival(1e-6 / (33 * 2048), 40) / 40, 1e-6, "threshold");
  });
});

test("a cell is the sum of squared correlations, written down from the definition", () => {
  const rateHz = 2.046e6;
  const scene = sceneOf("66".repeat(32), rateHz, [19], 0);
  const { samples } = synthesizeCi8({ ...scene, durationMs: 6 }, seededRandom("66".repeat(32), "noise"));
  const settings = { ...plan, coherentMs: 2, sums: 3, dopplerHalfWidthHz: 1000, dopplerStepHz: 500 };
  const { power, dopplersHz, lagsChips } = searchGrid({ samples, rateHz }, 19, settings);
  const lines = codeHarmonics(19, 1023);
  const direct = (dopplerHz: number, chips: number) => {
    let total = 0;
    for (let sum = 0; sum < 3; sum++) {
      // The code's own drift is undone at the middle of each sum.
      const drift = (dopplerHz / 1540) * (2 * sum + 1) * 1e-3;
      let [re, im] = [0, 0];
      for (let n = 0; n < 2 * 2046; n++) {
        const place = (chips + drift) / 1023 + n / 2046;
        let code = lines[0];
        for (let k = 1; k <= 1023; k++) {
          const angle = 2 * Math.PI * ((k * place) % 1);
          code += 2 * (lines[2 * k] * Math.cos(angle) - lines[2 * k + 1] * Math.sin(angle));
        }
        const turn = (-2 * Math.PI * dopplerHz * n) / rateHz;
        const [i, q] = [samples[2 * (sum * 4092 + n)], samples[2 * (sum * 4092 + n) + 1]];
        re += code * (i * Math.cos(turn) - q * Math.sin(turn));
        im += code * (i * Math.sin(turn) + q * Math.cos(turn));
      }
      total += re * re + im * im;
    }
    return total;
  };
  const cells = [
    [0, 17],
    [4, 2000],
  ].map(([row, lag]) => power[row * 2048 + lag] / direct(dopplersHz[row], lagsChips[lag]));
  expectNear(cells[0] / cells[1], 1, 1e-5, "ratio of the two scales"); // the grid is stored in single precision
});

test("a silent capture has no satellite and no broken number", () => {
  const small = { ...plan, coherentMs: 1, sums: 2, dopplerHalfWidthHz: 500, dopplerStepHz: 500, prns: [1] };
  const [search] = acquire({ samples: new Int8Array(2 * 2046 * 2), rateHz: 2.046e6 }, small);
  expect(search.found).toBe(false);
  for (const value of [search.codePhaseChips, search.dopplerHz, search.cn0DbHz, search.peak, search.noise])
    expect(Number.isFinite(value)).toBe(true);
});

test("reports progress row by row to the end", () => {
  const samples = new Int8Array(2 * 2046 * 2).fill(1);
  const calls: [number, number][] = [];
  const small = { ...plan, coherentMs: 1, sums: 2, dopplerHalfWidthHz: 1000, dopplerStepHz: 500, prns: [1, 2] };
  acquire({ samples, rateHz: 2.046e6 }, small, (done, total) => calls.push([done, total]));
  expect(calls.map(([done]) => done)).toEqual([1, 2, 3, 4, 5, 6, 7]);
  expect(calls.every(([, total]) => total === 7)).toBe(true);
});

test.each<[string, Partial<SearchSettings>]>([
  ["a capture that is too short", { coherentMs: 10, sums: 2 }],
  ["half a millisecond", { coherentMs: 0.5 }],
  ["no sums", { sums: 0 }],
  ["no false alarms at all", { falseAlarmPerSearch: 0 }],
  ["no Doppler step", { dopplerStepHz: 0 }],
  ["more bins than anybody needs", { dopplerStepHz: 0.1 }],
])("refuses %s", (_what, change) => {
  const capture = { samples: new Int8Array(2 * 2046 * 12), rateHz: 2.046e6 };
  expect(() => acquire(capture, { ...plan, coherentMs: 1, sums: 2, ...change, prns: [1] })).toThrow(RangeError);
});
