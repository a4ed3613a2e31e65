import { clockErrorHz } from "@/lib/gnss/doppler";
import type { Scene, SceneSatellite } from "@/lib/gnss/scene";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { drawRateHz } from "../capture-rate";
import { between, drawSatellite } from "../drawSatellite";
import { drawStart } from "../drawStart";
import { ALL_PRNS } from "../searchCapture";
import type { SatellitesParameters } from "./parameters";

export type SatellitesTruth = {
  scene: Scene;
  clockPpm: number;
  foundFromDbHz: number;
  /** Half width that the case tells the candidate to search. */
  windowHz: number;
  startedAt: string;
};

export type DrawnScene = { truth: SatellitesTruth; draws: number };

const DURATION_MS = 100;
const LEAST_TO_FIND = 3;

/** Satellites of one capture; drawn again while too few of them have to be found. */
export function drawScene(seedHex: string, parameters: SatellitesParameters): DrawnScene {
  for (let draws = 1; draws <= 5000; draws++) {
    const random = seededRandom(seedHex, `satellites@1/draw-${draws}`);
    const truth = drawTruth(parameters, random);
    if (truth.scene.satellites.filter(mustBeFound(truth)).length >= LEAST_TO_FIND) return { truth, draws };
  }
  throw new Error("satellites: no scene with enough strong satellites in 5 000 draws");
}

export const mustBeFound =
  ({ foundFromDbHz }: SatellitesTruth) =>
  ({ cn0DbHz }: SceneSatellite): boolean =>
    cn0DbHz >= foundFromDbHz;

function drawTruth(parameters: SatellitesParameters, random: Random): SatellitesTruth {
  const count = random.integer(...parameters.satellites);
  const prns = random.shuffle(ALL_PRNS).slice(0, count);
  const clockPpm = between(random, -parameters.clock, parameters.clock);
  const rateHz = drawRateHz(parameters.rate, random);
  const startedAt = drawStart(random);
  const satellites = prns
    .sort((a, b) => a - b)
    .map((prn) =>
      drawSatellite(random, {
        prn,
        cn0DbHz: between(random, ...parameters.cn0),
        dopplerHz: between(random, -parameters.motion, parameters.motion) + clockErrorHz(clockPpm),
      }),
    );
  const windowHz = Math.ceil((parameters.motion + clockErrorHz(parameters.clock)) / 1000) * 1000;
  const scene: Scene = { rateHz, durationMs: DURATION_MS, ifHz: 0, satellites };
  return { scene, clockPpm, foundFromDbHz: parameters.foundFrom, windowHz, startedAt };
}
