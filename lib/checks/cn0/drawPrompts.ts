import { DATA_BIT_MS } from "@/lib/gnss/constants";
import { coherentSnr } from "@/lib/gnss/detection";
import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { PROMPT_S } from "./estimates";

export const PROMPTS = 2000; // 2 s

export type Channel = {
  cn0DbHz: number;
  /** Prompt at which a data bit begins, 0 to 19. */
  edge: number;
  residualHz: number;
  /** Counts: I and Q of each prompt in turn. */
  prompts: number[];
};

const SIGMA_COUNTS = { from: 20, to: 120 } as const; // rounding to whole counts adds less than 0.001 dB of noise

/**
 * Prompts as they would be without bits and residual: the signal upright in I, noise of variance 1 in I and Q. White noise
 * stays the same in law however it is turned, so that what depends on power alone can be told before the rest is drawn.
 */
export function drawSteady(cn0DbHz: number, random: Random): Float64Array {
  const amplitude = Math.sqrt(2 * coherentSnr(cn0DbHz, PROMPT_S));
  const steady = new Float64Array(2 * PROMPTS);
  for (let at = 0; at < 2 * PROMPTS; at += 2) {
    steady[at] = amplitude + random.gaussian();
    steady[at + 1] = random.gaussian();
  }
  return steady;
}

/** One channel: random bits and a constant residual put on, scaled to whole counts as a receiver gives them. */
export function drawPrompts(steady: Float64Array, residualHz: number, random: Random): Omit<Channel, "cn0DbHz"> {
  const edge = random.integer(0, DATA_BIT_MS - 1);
  const phaseTurns = random.uniform();
  const sigma = SIGMA_COUNTS.from + random.uniform() * (SIGMA_COUNTS.to - SIGMA_COUNTS.from);
  const prompts = new Array<number>(2 * PROMPTS);
  let bit = random.pick([-1, 1]);
  for (let n = 0; n < PROMPTS; n++) {
    if (n % DATA_BIT_MS === edge) bit = random.pick([-1, 1]);
    const turns = phaseTurns + residualHz * PROMPT_S * (n + 0.5);
    const [re, im] = [bit * sigma * cosTurns(turns), bit * sigma * sinTurns(turns)];
    const [i, q] = [steady[2 * n], steady[2 * n + 1]];
    prompts[2 * n] = counts(i * re - q * im);
    prompts[2 * n + 1] = counts(i * im + q * re);
  }
  return { edge, residualHz, prompts };
}

/** Whole, and no minus zero. */
const counts = (value: number) => Math.round(value) + 0;
