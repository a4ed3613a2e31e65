import type { ValuesOf } from "@/lib/calculators/calculator";
import type { CHAIN_LEVELS } from "@/lib/calculators/chainLevels";
import { chainLevels, type ChainLevel, type ChainPart } from "@/lib/gnss/chain/chainLevels";
import { dcFeed, type DcFeed, type DcPart } from "@/lib/gnss/chain/dcFeed";
import { pow10Db } from "@/lib/numeric/elementary";

export type ChainValues = ValuesOf<typeof CHAIN_LEVELS>;

export type Chain = {
  /** At the output of each part, the receiver left out. */
  levels: ChainLevel[];
  last: ChainLevel;
  /** Of chain and receiver together. */
  noiseFigureDb: number;
  cn0DbHz: number;
  /** Smallest of all parts; null when nothing can be overdriven. */
  headroomDb: number | null;
  tightest: string;
  feed: DcFeed;
  /** At the parts that draw current; null when none does. */
  leastVolts: number | null;
  hungriest: string;
  /** In words, worst first. */
  faults: string[];
  /** Noise factor of each part and the gain before it, the receiver last. */
  factors: { noise: number; gain: number }[];
};

/** What the figures of the parts come to. */
export function chainOf(values: ChainValues): Chain {
  const parts = values.parts.map(({ figures }) => partOf(figures));
  const receiver: ChainPart = { gainDb: 0, noiseFigureDb: values.receiverNoiseDb, outputCompressionDbm: null };
  const all = chainLevels([...parts, receiver], values);
  const levels = all.slice(0, -1);
  const last = levels[levels.length - 1];
  const tight = smallest(levels.map(({ headroomDb }) => (headroomDb === Infinity ? null : headroomDb)));
  const drawing = values.parts.map(({ figures }) => dcPartOf(figures));
  const feed = dcFeed(drawing, { volts: values.supplyV, limitMa: values.limitMa, sourceOhm: values.sourceOhm });
  const hungry = smallest(feed.parts.map(({ volts }, at) => (drawing[at].currentMa > 0 ? (volts ?? 0) : null)));
  return {
    levels,
    last,
    noiseFigureDb: all[all.length - 1].noiseFigureDb,
    cn0DbHz: all[all.length - 1].cn0DbHz,
    headroomDb: tight?.value ?? null,
    tightest: tight ? values.parts[tight.at].name : "",
    feed,
    leastVolts: hungry?.value ?? null,
    hungriest: hungry ? values.parts[hungry.at].name : "",
    faults: faultsOf(values, last, levels, feed),
    factors: [...parts, receiver].map((part, at) => ({
      noise: pow10Db(part.noiseFigureDb),
      gain: pow10Db(at === 0 ? 0 : levels[at - 1].gainDb),
    })),
  };
}

/** In the order of the columns: gain, noise figure, compression, current, least voltage, resistance. */
function partOf([gain, noise, compression]: readonly (number | null)[]): ChainPart {
  const gainDb = gain ?? 0;
  return { gainDb, noiseFigureDb: noise ?? Math.max(0, -gainDb), outputCompressionDbm: compression };
}

const dcPartOf = ([, , , current, volts, ohm]: readonly (number | null)[]): DcPart => ({
  currentMa: current ?? 0,
  minimumV: volts ?? 0,
  resistanceOhm: ohm ?? 0,
  passesDc: ohm !== null,
});

function smallest(values: readonly (number | null)[]): { value: number; at: number } | null {
  let found: { value: number; at: number } | null = null;
  values.forEach((value, at) => {
    if (value !== null && (found === null || value < found.value)) found = { value, at };
  });
  return found;
}

function faultsOf(values: ChainValues, last: ChainLevel, levels: readonly ChainLevel[], feed: DcFeed): string[] {
  const faults: string[] = [];
  values.parts.forEach(({ name }, at) => {
    if (!feed.parts[at].fed)
      faults.push(`${name} ${feed.parts[at].volts === null ? "gets no feed" : "gets too little voltage"}`);
  });
  if (!feed.withinLimit) faults.push("The parts draw more than the feed gives");
  values.parts.forEach(({ name }, at) => {
    if (levels[at].headroomDb < 0) faults.push(`${name} is driven beyond its 1 dB point`);
  });
  if (last.gainDb < values.leastGainDb) faults.push("Too little gain for the receiver");
  if (last.gainDb > values.mostGainDb) faults.push("Too much gain for the receiver");
  return faults.map((fault) => fault[0].toUpperCase() + fault.slice(1));
}
