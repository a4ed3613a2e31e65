import { sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import type { PulseAcceptanceParameters } from "./parameters";

export const INTERVAL_S = 30;
const DAY_S = 86_400;
export const READINGS = DAY_S / INTERVAL_S + 1;

/** What a log is made of, besides its constant part. */
export type LogShape = {
  waveNs: number;
  sawtoothNs: number;
  /** `index` is the first reading after the step. */
  step: { index: number; sizeNs: number } | null;
  triggers: { index: number; sizeNs: number }[];
};

const EDGE = 240; // two hours at either end without step or missed trigger
const APART = 40; // readings between step and missed triggers, so that each stands alone
const OVER_SAWTOOTH = 1.5;
const MISSED_NS = [150, 900] as const;
const NOISE_NS = [0.3, 0.8] as const;

export function drawShape(parameters: PulseAcceptanceParameters, hasStep: boolean, random: Random): LogShape {
  const waveNs = between(random, ...parameters.wave);
  const sawtoothNs = between(random, ...parameters.sawtooth);
  const [least, most] = parameters.step;
  const lowest = Math.max(least, OVER_SAWTOOTH * sawtoothNs);
  const sizeNs = between(random, lowest, Math.max(lowest, most)) * random.pick([-1, 1]);
  const places = drawPlaces(random, 1 + random.integer(...parameters.triggers));
  const missed = places
    .slice(1)
    .map((index) => ({ index, sizeNs: between(random, ...MISSED_NS) * random.pick([-1, 1]) }));
  return { waveNs, sawtoothNs, step: hasStep ? { index: places[0], sizeNs } : null, triggers: missed };
}

function drawPlaces(random: Random, count: number): number[] {
  const places: number[] = [];
  while (places.length < count) {
    const place = random.integer(EDGE, READINGS - 1 - EDGE);
    if (places.every((other) => Math.abs(place - other) >= APART)) places.push(place);
  }
  return places;
}

/**
 * Time error in ns without its constant part and its missed triggers: a daily wave, the sawtooth of a pulse that leaves
 * on edges of the receiver's own clock, the step, and noise. Sizes: common practice, no source.
 */
export function drawSeries({ waveNs, sawtoothNs, step }: LogShape, random: Random): Float64Array {
  const wavePhase = random.uniform();
  const sawPhase = random.uniform();
  const perReading = between(random, 0.12, 0.4); // cycles; slower, a tooth would look like a step
  const faster = between(random, -0.05, 0.05) / READINGS;
  const noiseNs = between(random, ...NOISE_NS);
  return Float64Array.from({ length: READINGS }, (_, n) => {
    const turns = sawPhase + n * perReading + (n * n * faster) / 2;
    const tooth = sawtoothNs * (turns - Math.floor(turns) - 0.5);
    const wave = waveNs * sinTurns((n * INTERVAL_S) / DAY_S + wavePhase);
    return wave + tooth + (step && n >= step.index ? step.sizeNs : 0) + noiseNs * random.gaussian();
  });
}
