import { momentsCn0DbHz } from "@/lib/gnss/tracking/cn0Estimators";
import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { drawPrompts, drawSteady, type Channel } from "./drawPrompts";
import { cutThroughBits, estimateCn0, noiseAveragedInDb, PROMPT_S, residualLeftIn, type Estimate } from "./estimates";
import type { Cn0Parameters } from "./parameters";

export type Cn0Channel = Channel & { prn: number; estimate: Estimate };
export type Cn0Truth = { channels: Cn0Channel[] };
export type DrawnCase = { truth: Cn0Truth; draws: number };

export const LEAST_APART_DB = 4;
export const WEAK_DB_HZ = 33; // below it twice the tolerance
const RESIDUAL_HZ = { from: 3, to: 5 } as const;

// Of the right method on these very prompts: within half of the narrowest tolerance that a lead may set.
const LARGEST_OWN_ERROR_DB = 0.3;
const LARGEST_WEAK_ERROR_DB = 0.6;
// Of the wrong methods: outside the widest.
const LEAST_WRONG_DB = 1.25;
const LEAST_MOMENTS_WRONG_DB = 2.1; // outside the default of 2 dB, whole counts and tenths of a dB in the answer included

const MOST_DRAWS = 3000; // of the weakest channel one draw in about fifty does

/** Four channels, each drawn until a right estimate is right and the wrong ones that it is there for are wrong. */
export function drawCase(seedHex: string, parameters: Cn0Parameters): DrawnCase {
  const random = seededRandom(seedHex, "cn0@1/case");
  const levels = drawLevels(parameters, random);
  const prns = random.shuffle(Array.from({ length: 32 }, (_, n) => n + 1));
  const order = random.shuffle([0, 1, 2, 3]);
  let draws = 0;
  const channels = order.map((rank, n) => {
    const drawn = drawChannel(levels[rank], rank, (draw) => seededRandom(seedHex, `cn0@1/channel-${n}/draw-${draw}`));
    draws += drawn.draws;
    return { ...drawn.channel, prn: prns[n], estimate: drawn.estimate };
  });
  return { truth: { channels }, draws };
}

/** From the weakest to the strongest, at least 4 dB apart. */
function drawLevels({ weakest, strongest }: Cn0Parameters, random: Random): number[] {
  const [low, high] = [between(random, ...weakest), between(random, ...strongest)];
  const spare = high - low - 3 * LEAST_APART_DB;
  const [first, second] = [random.uniform() * spare, random.uniform() * spare];
  return [
    low,
    low + LEAST_APART_DB + Math.min(first, second),
    low + 2 * LEAST_APART_DB + Math.max(first, second),
    high,
  ];
}

type DrawnChannel = { channel: Channel; estimate: Estimate; draws: number };

function drawChannel(cn0DbHz: number, rank: number, streamOf: (draw: number) => Random): DrawnChannel {
  for (let draws = 1; draws <= MOST_DRAWS; draws++) {
    const random = streamOf(draws);
    const steady = drawSteady(cn0DbHz, random);
    // The weakest is there for the method of moments, which looks at power alone.
    if (rank === 0 && Math.abs(momentsCn0DbHz(steady, PROMPT_S) - cn0DbHz) < LEAST_MOMENTS_WRONG_DB) continue;
    const residualHz = random.pick([-1, 1]) * between(random, RESIDUAL_HZ.from, RESIDUAL_HZ.to);
    const channel = { cn0DbHz, ...drawPrompts(steady, residualHz, random) };
    const estimate = estimateCn0(channel.prompts);
    if (!estimate || !isRight(estimate, channel)) continue;
    if (rank === 3 && !showsMistakes(channel, estimate)) continue;
    return { channel, estimate, draws };
  }
  throw new Error(`cn0: no fair channel in ${MOST_DRAWS} draws`);
}

const isRight = ({ edge, cn0DbHz }: Estimate, channel: Channel): boolean =>
  edge === channel.edge &&
  Math.abs(cn0DbHz - channel.cn0DbHz) <= (channel.cn0DbHz < WEAK_DB_HZ ? LARGEST_WEAK_ERROR_DB : LARGEST_OWN_ERROR_DB);

/** On the strongest channel every mistake about bits, residual and noise is plain. */
const showsMistakes = ({ prompts, cn0DbHz }: Channel, estimate: Estimate): boolean =>
  [cutThroughBits, residualLeftIn, noiseAveragedInDb].every(
    (wrong) => !(Math.abs(wrong(prompts, estimate) - cn0DbHz) < LEAST_WRONG_DB),
  );
