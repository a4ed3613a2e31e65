import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import type { SceneSatellite } from "@/lib/gnss/scene";
import type { Random } from "@/lib/numeric/random";

const BITS = 8; // more than 100 ms can hold

/** What is free in a satellite's signal: code phase, carrier phase, data bits and their edge. */
export const drawSatellite = (
  random: Random,
  given: Pick<SceneSatellite, "prn" | "cn0DbHz" | "dopplerHz">,
): SceneSatellite => ({
  ...given,
  codePhaseChips: random.uniform() * CA_LENGTH_CHIPS,
  carrierPhaseCycles: random.uniform(),
  dataBits: Int8Array.from({ length: BITS }, () => random.pick([-1, 1])),
  bitEdgeMs: random.integer(0, 19),
});

export const between = (random: Random, from: number, to: number): number => from + random.uniform() * (to - from);
