import { expect, test } from "vitest";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import { synthesizeCi8 } from "@/lib/gnss/synthesize";
import { bitsOfPrompts, readNavigation } from "@/lib/gnss/tracking/readNavigation";
import { residualFrequencyHz } from "@/lib/gnss/tracking/residualFrequency";
import { trackSatellite } from "@/lib/gnss/tracking/trackSatellite";
import { seededRandom } from "@/lib/numeric/random";
import { GPS_SUBFRAMES, sentBits } from "@/tests/reference/gps-subframes";
import { expectNear } from "@/tests/support/expectNear";

// A subframe that a satellite sent, put on a carrier in noise: its hand-over word must come back through search place,
// loops, bit edge and parity.
test("the time of week and the week are read from the samples of seven seconds", () => {
  const random = seededRandom("f".repeat(64), "bits");
  const lead = Array.from({ length: 20 }, () => random.integer(0, 1));
  const bits = [...lead, ...sentBits(GPS_SUBFRAMES[0].hex), ...lead];
  const satellite = {
    prn: 17,
    codePhaseChips: 77.7,
    dopplerHz: -2210,
    cn0DbHz: 44,
    carrierPhaseCycles: 0.6,
    dataBits: Int8Array.from(bits, (bit) => (bit ? -1 : 1)),
    bitEdgeMs: 6,
  };
  const scene = { rateHz: 2.046e6, durationMs: 6700, ifHz: 0 as const, satellites: [satellite] };
  const { samples } = synthesizeCi8(scene, seededRandom("f".repeat(64), "noise"));
  const { prompts, bitEdge } = trackSatellite(
    { samples, complex: true, rateHz: 2.046e6, ifHz: 0 },
    searchSignalOf(gpsL1Ca),
    17,
    { codePhaseChips: 77.5, dopplerHz: -2190 },
  );
  const read = readNavigation(bitsOfPrompts(prompts, bitEdge!));
  expect(read).toEqual([{ firstBit: 19, subframe: 1, timeOfWeekS: 5010, week: 194, goodWords: 10 }]);
  expectNear(residualFrequencyHz(prompts.subarray(2 * 1000), bitEdge!, 20, 1e-3), 0, 0.5, "residual frequency");
});
