import { describe, expect, test } from "vitest";
import { searchSky } from "@/lib/gnss/search/searchSky";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";
import { rawCapture, type RawSatellite } from "./rawCapture";

const signal = searchSignalOf(gpsL1Ca);
const ALL = Array.from({ length: 32 }, (_, n) => n + 1);
const request = { coherentMs: 1, sums: 20, dopplerHalfWidthHz: 5000, falseAlarmPerSearch: 1e-3 / 32 };
const around = (chips: number) => chips - 1023 * Math.round(chips / 1023);

const nearFar: RawSatellite[] = [
  { prn: 3, codePhaseChips: 132.0, dopplerHz: 1157, cn0DbHz: 58 },
  { prn: 11, codePhaseChips: 700.6, dopplerHz: -2100, cn0DbHz: 39 },
  { prn: 27, codePhaseChips: 412.9, dopplerHz: -400, cn0DbHz: 42 },
];

describe.each<[string, number, number, boolean]>([
  ["hard chips at 4.092 Msps", 4.092e6, 0, true],
  ["real samples at 5.456 Msps, carrier at 1.25 MHz", 5.456e6, 1.25e6, false],
])("one satellite at 58 dB-Hz beside weak ones: %s", (_name, rateHz, ifHz, complex) => {
  const capture = rawCapture({ seed: "51".repeat(32), rateHz, ifHz, complex, durationMs: 20, satellites: nearFar });
  const { findings, cancelledPrns } = searchSky(capture, signal, ALL, [], request);
  const genuine = findings.filter(({ verdict }) => verdict === "genuine");

  test("calls genuine what is there, and nothing else", () => {
    expect(genuine.map(({ prn }) => prn)).toEqual([3, 11, 27]);
    expect(cancelledPrns).toEqual([3]);
  });

  test("names the strong one's shadows and whose they are", () => {
    const shadows = findings.filter((finding) => finding.verdict === "cross-correlation");
    expect(shadows.length).toBeGreaterThan(5); // C/A codes leave -21 to -24 dB in each other: some 35 dB-Hz
    for (const shadow of shadows) {
      expect(shadow.parentPrn).toBe(3);
      // The worst pair of C/A codes half a kHz apart over 1 ms: -19.4 dB.
      expect(shadow.levelDb).toBeLessThan(-19.3);
      expect(shadow.levelDb).toBeGreaterThan(-27);
    }
  });

  test.each(nearFar)("reads PRN $prn through the strong one", (truth) => {
    const finding = genuine.find(({ prn }) => prn === truth.prn)!;
    expectNear(around(finding.codePhaseChips - truth.codePhaseChips), 0, 0.2, "code phase in chips");
    expectNear(finding.dopplerHz, truth.dopplerHz, 40, "Doppler in Hz");
    expectNear(finding.cn0DbHz, truth.cn0DbHz, 1.5, "C/N0 in dB-Hz");
  });
});

test("takes out a signal whose code was filtered to the band as well", () => {
  const rateHz = 2.046e6;
  const satellites = nearFar.map((one) => ({ ...one, carrierPhaseCycles: 0.3, dataBits: null, bitEdgeMs: 0 }));
  const scene = { rateHz, durationMs: 20, ifHz: 0 as const, satellites };
  const { samples } = synthesizeCi8(scene, seededRandom("52".repeat(32), "noise"));
  const { findings } = searchSky({ samples, complex: true, rateHz, ifHz: 0 }, signal, ALL, [], request);
  expect(findings.filter(({ verdict }) => verdict === "genuine").map(({ prn }) => prn)).toEqual([3, 11, 27]);
});

test("a shadow is known for one even when its parent was not asked for", () => {
  const capture = rawCapture({
    seed: "51".repeat(32),
    rateHz: 4.092e6,
    ifHz: 0,
    complex: true,
    durationMs: 20,
    satellites: nearFar.slice(0, 1),
  });
  const asked = ALL.filter((prn) => prn !== 3).slice(0, 8);
  const { findings } = searchSky(capture, signal, asked, ALL, request);
  expect(findings.length).toBeGreaterThan(0);
  for (const finding of findings) expect(finding).toMatchObject({ verdict: "cross-correlation", parentPrn: 3 });
});

// 60 dB-Hz raise the noise of their own grid by 2 dB, so that the shadow of PRN 3 at PRN 30 reads 16.6 dB below, not 19.
test("a very strong satellite alone makes no second one, though it reads low beside its own noise", () => {
  const strong = { prn: 3, codePhaseChips: 132.0, dopplerHz: 1157, cn0DbHz: 60 };
  const scene = { seed: "51".repeat(32), rateHz: 2.046e6, ifHz: 0, complex: true, durationMs: 5 };
  const plan = { ...request, sums: 5, dopplerHalfWidthHz: 3000 };
  const capture = rawCapture({ ...scene, satellites: [strong] });
  const { findings } = searchSky(capture, signal, [3, 4, 16, 17, 30], [], plan);
  const genuine = findings.filter(({ verdict }) => verdict === "genuine");
  expect(genuine.map(({ prn }) => prn)).toEqual([3]);
  const shadow = findings.find(({ prn }) => prn === 30);
  expect(shadow).toMatchObject({ verdict: "cross-correlation", parentPrn: 3 });
});

describe("interference", () => {
  const satellites = nearFar.slice(1).map((one) => ({ ...one, cn0DbHz: 43 }));
  const scene = { rateHz: 4.092e6, ifHz: 0, complex: true, durationMs: 20, satellites };
  const found = (capture: Parameters<typeof searchSky>[0]) => searchSky(capture, signal, ALL, [], request);

  test("a tone 30 dB above the strongest is excised and named, and makes no satellite", () => {
    const tone = { offsetHz: 123_456, jamToSignalDb: 30 };
    const { findings, excision } = found(rawCapture({ ...scene, seed: "53".repeat(32), tone }));
    expect(findings.map(({ prn, verdict }) => `${prn} ${verdict}`)).toEqual(["11 genuine", "27 genuine"]);
    expect(excision.bands[0].fromHz).toBeLessThan(123_456);
    expect(excision.bands[0].toHz).toBeGreaterThan(123_456);
    // 43 + 30 dB-Hz in cells of 1 kHz (30 dB-Hz of noise): 43 dB, less the window's loss at up to half a cell off
    expectNear(excision.bands[0].overNoiseDb, 42, 2.5, "level of the tone above the noise");
    expect(excision.share).toBeLessThan(0.02);
  });

  test("pulses are blanked", () => {
    const capture = rawCapture({ ...scene, seed: "54".repeat(32) });
    for (let n = 0; n < capture.samples.length; n++) if (n % 8184 < 400) capture.samples[n] *= 30; // 49 us in every ms
    const { findings, blankedShare } = found(capture);
    expect(findings.map(({ prn, verdict }) => `${prn} ${verdict}`)).toEqual(["11 genuine", "27 genuine"]);
    expect(blankedShare).toBeGreaterThan(0.04);
    expect(blankedShare).toBeLessThan(0.12);
  });

  test("an open sky is left as it is", () => {
    const { excision, blankedShare, cancelledPrns } = found(rawCapture({ ...scene, seed: "55".repeat(32) }));
    expect(excision).toEqual({ share: 0, bands: [] });
    expect(blankedShare).toBe(0);
    expect(cancelledPrns).toEqual([]);
  });
});

test("noise alone holds no satellite", () => {
  const capture = rawCapture({
    seed: "56".repeat(32),
    rateHz: 2.048e6,
    ifHz: 0,
    complex: true,
    durationMs: 20,
    satellites: [],
  });
  expect(searchSky(capture, signal, ALL, [], request).findings).toEqual([]);
});
