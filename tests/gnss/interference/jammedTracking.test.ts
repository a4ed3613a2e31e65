import { describe, expect, test } from "vitest";
import { createInterference } from "@/lib/gnss/interference/addInterference";
import type { Interferer } from "@/lib/gnss/interference/interferer";
import { powerOfJs } from "@/lib/gnss/interference/measureInterference";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { effectiveCn0DbHz } from "@/lib/gnss/spectra/effectiveCn0";
import { bpsk } from "@/lib/gnss/spectra/modulation";
import { spectralSeparation, type InterferenceSpectrum } from "@/lib/gnss/spectra/spectralSeparation";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { narrowWideCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { trackSatellite } from "@/lib/gnss/tracking/trackSatellite";
import { seededRandom } from "@/lib/numeric/random";
import { expectNear } from "@/tests/support/expectNear";

const RATE_HZ = 4.092e6;
const CN0_DB_HZ = 45;
const DURATION_MS = 600;
const random = (name: string) => seededRandom("e".repeat(64), name);

const satellite = {
  prn: 12,
  codePhaseChips: 511.3,
  dopplerHz: -1800,
  cn0DbHz: CN0_DB_HZ,
  carrierPhaseCycles: 0.1,
  dataBits: null,
  bitEdgeMs: 0,
};
const { samples: clean, scale } = synthesizeCi8(
  { rateHz: RATE_HZ, durationMs: DURATION_MS, ifHz: 0, satellites: [satellite] },
  random("noise"),
);

/** C/N0 that a tracking channel reads with an interference added. */
function measured(interferer: Interferer): number {
  const samples = Float64Array.from(clean);
  createInterference(interferer, RATE_HZ, random("interference")).addTo(samples);
  const { prompts } = trackSatellite(
    { samples, complex: true, rateHz: RATE_HZ, ifHz: 0 },
    searchSignalOf(gpsL1Ca),
    12,
    satellite,
    [{ periods: Infinity, coherentPeriods: 1, spacingChips: 1, dllHz: 1, pllOrder: 2, pllHz: 10, fllHz: 0 }],
  );
  return narrowWideCn0DbHz(prompts, 100, 20, 1e-3);
}

// Betz; Kaplan & Hegarty, 2nd edition, chapter 6: what the separation of two spectra says is what a receiver reads. 25
// blocks of 20 ms scatter by about 0.4 dB, C/N0 counts the power in a band of 4 MHz, and the noise's edges are not
// those of a box.
describe("a satellite of 45 dB-Hz under interference of J/S 30 reads the effective C/N0", () => {
  const power = powerOfJs(30, CN0_DB_HZ, scale, RATE_HZ);
  test.each([
    [
      "noise over the main lobe",
      { kind: "noise", power, offsetHz: 0, widthHz: 2.046e6 },
      { kind: "band", offsetHz: 0, widthHz: 2.046e6 },
    ],
    [
      "a sweep over the band",
      { kind: "sweep", power, offsetHz: 0, widthHz: 3.6e6, periodS: 37e-6, shape: "saw" },
      { kind: "band", offsetHz: 0, widthHz: 3.6e6 },
    ],
  ] as [string, Interferer, InterferenceSpectrum][])("from %s", (_name, interferer, spectrum) => {
    const separationPerHz = spectralSeparation(spectrum, bpsk(1), RATE_HZ);
    const expected = effectiveCn0DbHz(CN0_DB_HZ, [{ jsDb: 30, separationPerHz }]);
    expectNear(measured(interferer), expected, 1.2, "C/N0");
  });

  test("and without any its own", () => {
    expectNear(measured({ kind: "tone", power: 0, offsetHz: 0, phaseCycles: 0 }), CN0_DB_HZ, 0.3, "C/N0");
    expect(power).toBeGreaterThan(0);
  });
});
