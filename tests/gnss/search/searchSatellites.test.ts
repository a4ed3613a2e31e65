import { describe, expect, test } from "vitest";
import type { SearchRequest } from "@/lib/gnss/search/searchPlanOf";
import { searchSatellites } from "@/lib/gnss/search/searchSatellites";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { galileoE1B } from "@/lib/gnss/signals/galileoE1B";
import { galileoE1C } from "@/lib/gnss/signals/galileoE1C";
import { gpsL1cP } from "@/lib/gnss/signals/gpsL1cP";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { gpsL5I } from "@/lib/gnss/signals/gpsL5I";
import type { Signal } from "@/lib/gnss/signals/signal";
import { chiSquareInverseSurvival } from "@/lib/numeric/chiSquare";
import { expectNear } from "@/tests/support/expectNear";
import { rawCapture, type RawSatellite } from "./rawCapture";

const signal = searchSignalOf(gpsL1Ca);
const request: SearchRequest = { coherentMs: 1, sums: 20, dopplerHalfWidthHz: 5000, falseAlarmPerSearch: 1e-4 };
const around = (chips: number) => chips - 1023 * Math.round(chips / 1023);

const satellites: RawSatellite[] = [
  { prn: 4, codePhaseChips: 1022.6, dopplerHz: -3720, cn0DbHz: 44 },
  { prn: 19, codePhaseChips: 301.37, dopplerHz: 260, cn0DbHz: 41 },
  { prn: 28, codePhaseChips: 0.2, dopplerHz: 4480, cn0DbHz: 42 },
];

// Rates with and without a whole number of samples in a millisecond; carrier at 0 Hz, beside it and aliased.
describe.each<[number, number, boolean]>([
  [2.048e6, 0, true],
  [2.3456789e6, 0, true],
  [4.092e6, 1.25e6, true],
  [5.456e6, 1.25e6, false],
  [5.456e6, 4.092e6, false],
  [16.368e6, 4.092e6, false],
])("%d samples/s, carrier at %d Hz, complex %s", (rateHz, ifHz, complex) => {
  const capture = rawCapture({ seed: "41".repeat(32), rateHz, ifHz, complex, durationMs: 20, satellites });
  const findings = searchSatellites(capture, signal, [4, 7, 13, 19, 28], request);

  test("finds what is there and nothing else", () => {
    expect(findings.filter(({ found }) => found).map(({ prn }) => prn)).toEqual([4, 19, 28]);
  });

  test.each(satellites)("reads PRN $prn", (truth) => {
    const finding = findings.find(({ prn }) => prn === truth.prn)!;
    expectNear(around(finding.codePhaseChips - truth.codePhaseChips), 0, 0.12, "code phase in chips");
    expectNear(finding.dopplerHz, truth.dopplerHz, 40, "Doppler in Hz");
    expectNear(finding.cn0DbHz, truth.cn0DbHz, 1.5, "C/N0 in dB-Hz");
  });
});

test("longer coherent sums find a weaker satellite and read it as well", () => {
  const weak = { prn: 11, codePhaseChips: 640.9, dopplerHz: -1234, cn0DbHz: 32 };
  const capture = rawCapture({
    seed: "42".repeat(32),
    rateHz: 2.1e6,
    ifHz: 0,
    complex: true,
    durationMs: 80,
    satellites: [weak],
  });
  const plan = { coherentMs: 4, sums: 20, dopplerHalfWidthHz: 2000, falseAlarmPerSearch: 1e-3 };
  const [finding] = searchSatellites(capture, signal, [11], plan);
  expect(finding.found).toBe(true);
  expectNear(around(finding.codePhaseChips - weak.codePhaseChips), 0, 0.15, "code phase in chips");
  expectNear(finding.dopplerHz, weak.dopplerHz, 20, "Doppler in Hz");
  expectNear(finding.cn0DbHz, weak.cn0DbHz, 1.5, "C/N0 in dB-Hz");
});

// All that differs between signals is data: code lengths of 4092 and 10230 chips, a subcarrier, symbols of one code period.
test.each<[string, Signal, number, number, number]>([
  ["Galileo E1-B", galileoE1B, 6.138e6, 4, 1],
  ["Galileo E1-C", galileoE1C, 5e6, 4, 1],
  ["GPS L5-I", gpsL5I, 25e6, 1, 0.25],
])("finds %s", (_name, definition, rateHz, coherentMs, bitEdgeStepMs) => {
  const other = searchSignalOf(definition);
  const truth = { prn: 12, codePhaseChips: 0.377 * other.lengthChips, dopplerHz: 870, cn0DbHz: 46 };
  const scene = { seed: "45".repeat(32), rateHz, ifHz: 0, complex: true, durationMs: 20, signal: other };
  const capture = rawCapture({ ...scene, satellites: [truth] });
  const plan = { coherentMs, sums: 4, dopplerHalfWidthHz: 1500, falseAlarmPerSearch: 1e-4, bitEdgeStepMs };
  const [finding, absent] = searchSatellites(capture, other, [12, 13], plan);
  expect([finding.found, absent.found]).toEqual([true, false]);
  expectNear(finding.codePhaseChips, truth.codePhaseChips, 0.15, "code phase in chips");
  expectNear(finding.dopplerHz, truth.dopplerHz, 60, "Doppler in Hz");
  expectNear(finding.cn0DbHz, truth.cn0DbHz, 2, "C/N0 in dB-Hz");
});

// Four chips of 33 carry a subcarrier of 6.138 MHz (IS-GPS-800, 3.3), which the search leaves out: 20 log(29/33) = -1.1 dB.
test("finds the pilot of GPS L1C with its two subcarriers and its secondary code", () => {
  const pilot = searchSignalOf(gpsL1cP);
  const truth = { prn: 9, codePhaseChips: 3857.2, dopplerHz: -30, cn0DbHz: 45 };
  const halvesOfChip = (chip: number) => ([0, 4, 6, 29].includes(chip % 33) ? 12 : 2);
  const scene = { seed: "48".repeat(32), rateHz: 13e6, ifHz: 0, complex: true, durationMs: 15, halvesOfChip };
  const capture = rawCapture({ ...scene, signal: pilot, satellites: [truth] });
  const plan = { coherentMs: 10, sums: 1, dopplerHalfWidthHz: 50, falseAlarmPerSearch: 1e-4, bitEdgeStepMs: 5 };
  const [finding, absent] = searchSatellites(capture, pilot, [9, 10], plan);
  expect([finding.found, absent.found]).toEqual([true, false]);
  expectNear(finding.codePhaseChips, truth.codePhaseChips, 0.1, "code phase in chips");
  expectNear(finding.dopplerHz, truth.dopplerHz, 15, "Doppler in Hz");
  expectNear(finding.cn0DbHz, truth.cn0DbHz - 1.1, 2, "C/N0 in dB-Hz");
});

test("a search that tries the bit edges finds what an unlucky start hides", () => {
  const weak = { prn: 6, codePhaseChips: 511.7, dopplerHz: 133, cn0DbHz: 33 };
  const scene = { seed: "46".repeat(32), rateHz: 2.1e6, ifHz: 0, complex: true, durationMs: 100 };
  const capture = rawCapture({ ...scene, satellites: [weak] });
  const plan = { coherentMs: 20, sums: 4, dopplerHalfWidthHz: 150, falseAlarmPerSearch: 1e-3 };
  const blind = [0, 5, 10, 15].map((startMs) => searchSatellites(capture, signal, [6], { ...plan, startMs })[0]);
  const [finding] = searchSatellites(capture, signal, [6], { ...plan, bitEdgeStepMs: 5 });
  expect(finding.found).toBe(true);
  expectNear(finding.peak, Math.max(...blind.map(({ peak }) => peak)), 1e-9, "peak");
  // A bit that changes in the middle of a sum takes all of it; how many of the four change is chance.
  expect(finding.peak).toBeGreaterThan(1.1 * Math.min(...blind.map(({ peak }) => peak)));
  expect(finding.threshold).toBeGreaterThan(blind[0].threshold); // the searches share the false alarms
  expectNear(around(finding.codePhaseChips - weak.codePhaseChips), 0, 0.15, "code phase in chips");
});

test("sums may begin later; the code phase stays that of the first sample, code Doppler included", () => {
  // 5 chips per second at 7.7 kHz: half a chip in 100 ms
  const fast = { prn: 23, codePhaseChips: 87.3, dopplerHz: 7700, cn0DbHz: 45 };
  const capture = rawCapture({
    seed: "43".repeat(32),
    rateHz: 2.5e6,
    ifHz: 0,
    complex: true,
    durationMs: 130,
    satellites: [fast],
  });
  const plan = { ...request, sums: 10, dopplerHalfWidthHz: 8000 };
  for (const startMs of [0, 120]) {
    const [finding] = searchSatellites(capture, signal, [23], { ...plan, startMs });
    expectNear(around(finding.codePhaseChips - 87.3), 0, 0.1, `code phase from ${startMs} ms`);
  }
});

test("noise alone passes the threshold as often as it was allowed to, or less", () => {
  // 40 grids at 5 %: 2 expected; 8 or more would come once in a thousand
  const capture = rawCapture({
    seed: "44".repeat(32),
    rateHz: 2.048e6,
    ifHz: 0,
    complex: true,
    durationMs: 10,
    satellites: [],
  });
  const prns = Array.from({ length: 37 }, (_, n) => n + 1).filter((prn) => prn !== 34); // the code of 37
  const plan = { ...request, sums: 10, falseAlarmPerSearch: 0.05 };
  const findings = searchSatellites(capture, signal, prns, plan);
  expect(findings.filter(({ found }) => found).length).toBeLessThan(8);
  const cells = 21 * 2048;
  const perCell = 1 - 0.95 ** (1 / cells);
  expectNear(findings[0].threshold, chiSquareInverseSurvival(perCell, 20) / 20, 1e-9, "threshold"); // D03, D05
  for (const { peak } of findings) expect(peak).toBeGreaterThan(2); // the highest of 43,000 cells
});

describe("real samples with the carrier at 0 Hz", () => {
  const scene = { seed: "47".repeat(32), rateHz: 4.5e6, ifHz: 0, complex: false, durationMs: 20 };

  test("give the code phase, and the Doppler but for its sign", () => {
    const capture = rawCapture({ ...scene, satellites: satellites.slice(1) });
    const findings = searchSatellites(capture, signal, [4, 19, 28], request);
    expect(findings.map(({ found }) => found)).toEqual([false, true, true]);
    for (const finding of findings.slice(1)) {
      const truth = satellites.find(({ prn }) => prn === finding.prn)!;
      expectNear(around(finding.codePhaseChips - truth.codePhaseChips), 0, 0.15, "code phase in chips");
      expectNear(Math.abs(finding.dopplerHz), Math.abs(truth.dopplerHz), 60, "Doppler in Hz");
    }
  });

  test("hold no satellite when there is none, though their noise has half the degrees of freedom", () => {
    const capture = rawCapture({ ...scene, satellites: [] });
    const findings = searchSatellites(capture, signal, [1, 5, 9, 14, 21, 30], request);
    expect(findings.filter(({ found }) => found)).toEqual([]);
  });
});

test("a silent capture has no satellite and no broken number", () => {
  const silent = { samples: new Int8Array(2 * 2048 * 2), complex: true, rateHz: 2.048e6, ifHz: 0 };
  const [finding] = searchSatellites(silent, signal, [1], { ...request, sums: 2 });
  expect(finding.found).toBe(false);
  for (const value of Object.values(finding).map(Number)) expect(Number.isFinite(value)).toBe(true);
});

test("reports progress to the end", () => {
  const silent = { samples: new Int8Array(2 * 2048 * 2), complex: true, rateHz: 2.048e6, ifHz: 0 };
  const calls: number[] = [];
  searchSatellites(silent, signal, [1, 2], { ...request, sums: 2, dopplerHalfWidthHz: 1000 }, (done, total) =>
    calls.push(done / total),
  );
  expect(calls).toEqual([1, 2, 3, 4, 5, 6, 7].map((done) => done / 7));
});

test.each<[string, Partial<SearchRequest>, object]>([
  ["a capture that is too short", { sums: 21 }, {}],
  ["a start that leaves too little", { startMs: 0.5 }, {}],
  ["half a code period", { coherentMs: 0.5 }, {}],
  ["no sums", { sums: 0 }, {}],
  ["no false alarms at all", { falseAlarmPerSearch: 0 }, {}],
  ["more bit edges than anybody needs", { bitEdgeStepMs: 0.01 }, {}],
  ["no Doppler step", { dopplerStepHz: 0 }, {}],
  ["more rows than anybody needs", { dopplerStepHz: 0.1 }, {}],
  ["a front end narrower than a third of the main lobe", {}, { rateHz: 0.6e6 }],
  ["a real capture whose carrier stands at half the rate", {}, { complex: false, ifHz: 1.024e6 }],
])("refuses %s", (_what, change, other) => {
  const capture = { samples: new Int8Array(2 * 2048 * 20), complex: true, rateHz: 2.048e6, ifHz: 0, ...other };
  expect(() => searchSatellites(capture, signal, [1], { ...request, ...change })).toThrow(RangeError);
});
