import { beforeAll, describe, expect, test } from "vitest";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { bpsk } from "@/lib/gnss/spectra/modulation";
import type { SampledCapture } from "@/lib/gnss/search/sampledCapture";
import { searchSignalOf, type SearchSignal } from "@/lib/gnss/search/searchSignal";
import { galileoE1B } from "@/lib/gnss/signals/galileoE1B";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { pllJitterDeg } from "@/lib/gnss/tracking/carrierJitter";
import { momentsCn0DbHz, narrowWideCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { dllJitterExactChips } from "@/lib/gnss/tracking/dllJitter";
import { lockStates, phaseLockIndicators } from "@/lib/gnss/tracking/lockDetectors";
import { bitsOfPrompts } from "@/lib/gnss/tracking/readNavigation";
import { discriminatorScaleChips, readReplica, replicaTable } from "@/lib/gnss/tracking/replicaTable";
import { trackSatellite, USUAL_STAGES, type Tracking, type TrackingStage } from "@/lib/gnss/tracking/trackSatellite";
import { seededRandom } from "@/lib/numeric/random";
import { standardDeviation } from "@/lib/numeric/statistics";
import { expectNear, expectNearRelative } from "@/tests/support/expectNear";

const SIGNAL = searchSignalOf(gpsL1Ca);
const random = (name: string) => seededRandom("c".repeat(64), name);
const bitsOf = (count: number) => {
  const draw = random("bits");
  return Int8Array.from({ length: count }, () => (draw.uniform() < 0.5 ? -1 : 1));
};

function capture(cn0DbHz: number, durationMs: number, rateHz: number) {
  const satellite = {
    prn: 7,
    codePhaseChips: 300.4,
    dopplerHz: 1234.5,
    cn0DbHz,
    carrierPhaseCycles: 0.3,
    dataBits: bitsOf(Math.ceil(durationMs / 20) + 2),
    bitEdgeMs: 13,
  };
  const scene = { rateHz, durationMs, ifHz: 0 as const, satellites: [satellite] };
  const { samples } = synthesizeCi8(scene, random("noise"));
  return { satellite, samples: { samples, complex: true, rateHz, ifHz: 0 } };
}

/** True code phase at a time: the code runs faster by a 1540th of the Doppler. */
const codeAt = (startChips: number, dopplerHz: number, timeS: number) =>
  (startChips + timeS * (1.023e6 + dopplerHz / 1540)) % CA_LENGTH_CHIPS;
const difference = (a: number, b: number) => {
  const turned = (a - b) / CA_LENGTH_CHIPS;
  return (turned - Math.round(turned)) * CA_LENGTH_CHIPS;
};

describe("a satellite of 45 dB-Hz", () => {
  const STEADY: TrackingStage[] = [
    { periods: 200, coherentPeriods: 1, spacingChips: 1, dllHz: 5, pllOrder: 2, pllHz: 0, fllHz: 15 },
    { periods: 500, coherentPeriods: 1, spacingChips: 0.5, dllHz: 4, pllOrder: 2, pllHz: 18, fllHz: 0 },
    { periods: Infinity, coherentPeriods: 1, spacingChips: 0.5, dllHz: 4, pllOrder: 2, pllHz: 18, fllHz: 0 },
  ];
  let truth: ReturnType<typeof capture>;
  let tracking: Tracking;
  beforeAll(() => {
    truth = capture(45, 6000, 2.046e6);
    const start = { codePhaseChips: truth.satellite.codePhaseChips + 0.3, dopplerHz: truth.satellite.dopplerHz - 40 };
    tracking = trackSatellite(truth.samples, SIGNAL, 7, start, STEADY);
  });
  const settled = () => tracking.records.filter(({ startS }) => startS > 0.7);
  const codeErrors = () =>
    settled().map(({ codePhaseChips, startS }) =>
      difference(codePhaseChips, codeAt(truth.satellite.codePhaseChips, truth.satellite.dopplerHz, startS)),
    );

  test("is followed in code and Doppler from a start that is off", () => {
    const errors = codeErrors();
    expect(Math.max(...errors.map(Math.abs))).toBeLessThan(0.1);
    expectNear(errors.reduce((sum, value) => sum + value, 0) / errors.length, 0, 0.01, "mean code error");
    const dopplers = settled().map(({ dopplerHz }) => dopplerHz);
    expectNear(dopplers.reduce((sum, value) => sum + value, 0) / dopplers.length, 1234.5, 0.3, "mean Doppler");
  });

  test("shows the code jitter of the formula", () => {
    // About 4 B t = 85 independent values in 5.3 s: a standard deviation known to 8 %. 25 % are three of these.
    const loop = { loopHz: 4, spacingChips: 0.5, cn0DbHz: 45, coherentS: 0.001 };
    expectNearRelative(standardDeviation(codeErrors()), dllJitterExactChips(loop, bpsk(1), 2.022e6), 0.25, "jitter");
  });

  test("shows the phase jitter of the formula", () => {
    // The replica's phase against the true one, both known; 4 B t = 380 independent values, a deviation known to 4 %.
    const errors = settled().map(({ carrierCycles, startS }) => {
      const cycles = 2 * (carrierCycles - (0.3 + 1234.5 * startS)); // a Costas loop may stand half a cycle off
      return (cycles - Math.round(cycles)) * 180;
    });
    expectNearRelative(standardDeviation(errors), pllJitterDeg(18, 45, 0.001), 0.15, "jitter");
    expectNear(errors.reduce((sum, value) => sum + value, 0) / errors.length, 0, 0.7, "mean phase error");
  });

  test("gives its C/N0 by both methods, its bits and its lock", () => {
    const from = 700 + tracking.bitEdge!;
    expectNear(narrowWideCn0DbHz(tracking.prompts, from, 20, 1e-3), 45, 0.4, "narrow and wide power");
    expectNear(momentsCn0DbHz(tracking.prompts.subarray(1400), 1e-3), 45, 0.4, "moments");
    const lock = phaseLockIndicators(tracking.prompts, from, 20);
    expect(Math.min(...lock)).toBeGreaterThan(0.9);
    expect(lockStates(lock).at(-1)).toBe(true);
  });
});

describe("a run of the usual stages", () => {
  const { satellite, samples } = capture(42, 1600, 4.092e6);
  const tracking = trackSatellite(samples, SIGNAL, 7, { codePhaseChips: 300.9, dopplerHz: 1234.5 + 90 });

  test("finds the bit edge and sums over parts of bits", () => {
    // the first whole period is the one after the period in progress at the first sample
    expect(tracking.bitEdge).toBe(satellite.bitEdgeMs - 1);
    expectNear(tracking.records.at(-1)!.lengthS, 0.01, 5e-7, "coherent time");
    const bits = bitsOfPrompts(tracking.prompts.subarray(2 * 600), tracking.bitEdge!);
    const sent = Array.from(satellite.dataBits.subarray(31, 31 + bits.length), (bit) => (bit > 0 ? 0 : 1));
    const wrong = bits.filter((bit, n) => bit !== sent[n]).length;
    expect([0, bits.length]).toContain(wrong); // a Costas loop may stand upside down
  });

  test("settles on code, Doppler and lock", () => {
    const last = tracking.records.at(-1)!;
    const code = codeAt(satellite.codePhaseChips, satellite.dopplerHz, last.startS);
    expectNear(difference(last.codePhaseChips, code), 0, 0.03, "code phase");
    expectNear(last.dopplerHz, 1234.5, 2, "Doppler");
  });
});

describe("another signal and another front end", () => {
  /** Real samples at an intermediate frequency, from the replica itself and white noise. */
  function realCapture(signal: SearchSignal, prn: number, cn0DbHz: number, durationS: number): SampledCapture {
    const [rateHz, ifHz] = [8.184e6, 2.046e6];
    const table = replicaTable(signal, prn, rateHz / 4);
    const noise = random("real");
    const draw = random("symbols");
    const symbols = Array.from({ length: Math.ceil(durationS / signal.symbolS) }, () =>
      draw.uniform() < 0.5 ? -1 : 1,
    );
    const amplitude = Math.sqrt((4 * 10 ** (cn0DbHz / 10)) / rateHz); // noise of variance 1 over rate/2 on one side
    const samples = Float64Array.from({ length: durationS * rateHz }, (_, n) => {
      const timeS = n / rateHz;
      const chips = timeS * signal.chipRateHz * (1 - 777 / signal.carrierHz);
      const place = ((chips % signal.lengthChips) + signal.lengthChips) % signal.lengthChips;
      const symbol = symbols[Math.floor(chips / signal.chipRateHz / signal.symbolS)];
      const code = readReplica(table, place * table.pointsPerChip);
      return amplitude * symbol * code * Math.cos(2 * Math.PI * ((timeS * (ifHz - 777)) % 1)) + noise.gaussian();
    });
    return { samples, complex: false, rateHz, ifHz };
  }

  test("Galileo E1-B in real samples is followed on its main peak", () => {
    const e1b = searchSignalOf(galileoE1B);
    const capture = realCapture(e1b, 11, 47, 0.5);
    const stages = [
      { periods: 40, coherentPeriods: 1, spacingChips: 0.3, dllHz: 3, pllOrder: 2 as const, pllHz: 0, fllHz: 8 },
      { periods: Infinity, coherentPeriods: 1, spacingChips: 0.3, dllHz: 2, pllOrder: 3 as const, pllHz: 12, fllHz: 0 },
    ];
    const { records, prompts } = trackSatellite(capture, e1b, 11, { codePhaseChips: 0.05, dopplerHz: -760 }, stages);
    const last = records.at(-1)!;
    const code = (last.startS * 1.023e6 * (1 - 777 / 1575.42e6)) % 4092;
    const error = last.codePhaseChips - code;
    expectNear(error - 4092 * Math.round(error / 4092), 0, 0.02, "code phase");
    expectNear(last.dopplerHz, -777, 2, "Doppler");
    expectNear(momentsCn0DbHz(prompts.subarray(2 * 50), 4e-3), 47, 1.5, "C/N0");
  });

  test("the discriminator's scale is 1 - D/2 for plain chips in a wide band and a third of it on BOC(1,1)'s slope", () => {
    expectNear(discriminatorScaleChips(replicaTable(SIGNAL, 3, 15e6), 0.5), 0.75, 0.02, "C/A");
    // R falls from 1 with slope 3: R = 1 - 3 D/2 at half of the spacing
    const scale = discriminatorScaleChips(replicaTable(searchSignalOf(galileoE1B), 3, 15e6), 0.3);
    expectNear(scale, (1 - 3 * 0.15) / 3, 0.02, "E1-B");
  });

  test("a run that cannot be is refused", () => {
    const { samples } = capture(45, 3, 2.046e6);
    const start = { codePhaseChips: 0, dopplerHz: 0 };
    const [stage] = USUAL_STAGES;
    expect(() => trackSatellite(samples, SIGNAL, 7, start, [])).toThrow(RangeError);
    expect(() => trackSatellite(samples, SIGNAL, 7, start, [{ ...stage, coherentPeriods: 3 }])).toThrow(RangeError);
    expect(() => trackSatellite(samples, SIGNAL, 7, start, [{ ...stage, spacingChips: 2 }])).toThrow(RangeError);
    expect(() => replicaTable(SIGNAL, 7, 500)).toThrow(RangeError);
  });
});
