import { chainLevels } from "@/lib/gnss/chain/chainLevels";
import { dcFeed } from "@/lib/gnss/chain/dcFeed";
import { cascade } from "@/lib/gnss/linkBudget";
import { dcPartOf, delayOfNs, stageOf, type Amplifier, type Part, type Surroundings } from "./site";

/** What a chain comes to, antenna first. */
export type Figures = {
  /** From the antenna to the receiver. */
  gainDb: number;
  /** Of chain and receiver together. */
  noiseFigureDb: number;
  delayNs: number;
  /** Of the neighbour's signal at each amplifier, from the antenna on. */
  amplifiers: FedAmplifier[];
  totalMa: number;
};

export type FedAmplifier = {
  part: Amplifier;
  /** From the neighbour's level at its output up to its 1 dB point. */
  headroomDb: number;
  /** null when no feed reaches it. */
  volts: number | null;
  lossBeforeDb: number;
};

// Only levels against the neighbour are taken from the levels; they hang on neither of these.
const ANTENNA = { antennaK: 290, signalDbm: -130 };

/** @param chain from the antenna on, at least one part */
export function figuresOf(chain: readonly Part[], site: Surroundings): Figures {
  const stages = chain.map((part) => stageOf(part, site));
  const levels = chainLevels(stages, { ...ANTENNA, strongDbm: site.neighbourDbm });
  const supply = { volts: site.supplyV, limitMa: site.limitMa, sourceOhm: site.sourceOhm };
  const feed = dcFeed(
    chain.map((part) => dcPartOf(part, site)),
    supply,
  );
  return {
    gainDb: levels[levels.length - 1].gainDb,
    noiseFigureDb: cascade([...stages, { gainDb: 0, noiseFigureDb: site.receiverNoiseDb }]).noiseFigureDb,
    delayNs: chain.reduce((sum, part) => sum + delayOfNs(part, site), 0),
    amplifiers: chain.flatMap((part, n) =>
      part.kind === "amplifier"
        ? [
            {
              part,
              headroomDb: levels[n].headroomDb,
              volts: feed.parts[n].volts,
              lossBeforeDb: n === 0 ? 0 : -levels[n - 1].gainDb,
            },
          ]
        : [],
    ),
    totalMa: feed.totalMa,
  };
}
