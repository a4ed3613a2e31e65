import type { Scene, SceneSatellite } from "@/lib/gnss/scene";
import { seededRandom } from "@/lib/numeric/random";

/** A sky of satellites drawn from a seed: C/N0 34 to 43 dB-Hz, Doppler within +-4 kHz of a common offset, random data. */
export function sceneOf(seed: string, rateHz: number, prns: readonly number[], commonOffsetHz: number): Scene {
  const random = seededRandom(seed, "scene");
  const satellites = prns.map((prn): SceneSatellite => ({
    prn,
    codePhaseChips: random.uniform() * 1023,
    dopplerHz: commonOffsetHz + (random.uniform() - 0.5) * 8000,
    cn0DbHz: 34 + 9 * random.uniform(),
    carrierPhaseCycles: random.uniform(),
    dataBits: Int8Array.from({ length: 7 }, () => (random.uniform() < 0.5 ? -1 : 1)),
    bitEdgeMs: random.integer(0, 19),
  }));
  return { rateHz, durationMs: 100, ifHz: 0, satellites };
}
