import type { Answers, BuiltCase, WrongMethod } from "../kind";
import type { ChainTruth } from "./drawCase";
import { figuresOf, type Figures } from "./figures";
import type { ChainParameters } from "./parameters";
import { bestChain } from "./possibleChains";
import { siteIn } from "./publicCase";
import type { Part, Site } from "./site";
import { answersFor } from "./solve";
import { amplifiersInRack, leastLoss, mostGain } from "./wrongChains";
import { delayLeftOutNs, lossLeftOutDb, noiseFiguresAddedDb } from "./wrongFigures";

type Wrong = WrongMethod<ChainParameters, ChainTruth>;
type Built = BuiltCase<ChainTruth>;

/** Typical wrong designs and figures; each differs from the right one in the named step alone. */
export const wrongMethods: Readonly<Record<string, Wrong>> = {
  "amplifier-in-the-rack": {
    label: "Amplifier in the rack instead of at the antenna",
    misses: ["noise"],
    solve: (built) => withChain(built, amplifiersInRack),
  },
  "most-gain": {
    label: "The amplifier with most gain, to be safe",
    misses: ["gain"],
    solve: (built) => withChain(built, mostGain),
  },
  "feed-overlooked": {
    label: "Parts of least loss, whether they pass direct current or not",
    misses: ["feed", "ownVolts"],
    solve({ publicCase }) {
      const site = siteIn(publicCase);
      const chain = bestChain(site)!;
      const blind = leastLoss(chain, site);
      // As somebody sees it who takes every part for one that passes.
      const [first] = figuresOf(chain, site).amplifiers;
      return { ...answersFor(blind, figuresOf(blind, site)), "figures.volts": `${first.volts!.toFixed(2)} V` };
    },
  },
  "loss-at-1-ghz": {
    label: "The sheet's loss at 1 GHz taken for the loss at L1",
    misses: ["ownGain"],
    solve: (built) =>
      withFigures(built, (one, chain, site) => ({ ...one, gainDb: one.gainDb + lossLeftOutDb(chain, site) })),
  },
  "noise-figures-added": {
    label: "Noise figures added up in dB",
    misses: ["ownNoise"],
    solve: (built) =>
      withFigures(built, (one, chain, site) => ({ ...one, noiseFigureDb: noiseFiguresAddedDb(chain, site) })),
  },
  "gain-before-the-1-db-point": {
    label: "1 dB point at the output compared with the level at the input",
    misses: ["ownHeadroom"],
    solve: (built) => withFirst(built, (first) => ({ ...first, headroomDb: first.headroomDb + first.part.gainDb })),
  },
  "speed-of-light-in-air": {
    label: "Run taken at the speed of light in air",
    misses: ["ownDelay"],
    solve: (built) =>
      withFigures(built, (one, chain, site) => ({ ...one, delayNs: one.delayNs - delayLeftOutNs(chain, site) })),
  },
  "no-drop": {
    label: "Volts of the receiver taken for those at the amplifier",
    misses: ["ownVolts"],
    solve: (built) => withFirst(built, (first, site) => ({ ...first, volts: site.supplyV })),
  },
};

/** Another chain, with its own figures worked out rightly. */
function withChain({ publicCase }: Built, change: (chain: readonly Part[], site: Site) => Part[]): Answers {
  const site = siteIn(publicCase);
  const chain = change(bestChain(site)!, site);
  return answersFor(chain, figuresOf(chain, site));
}

/** The right chain with a figure worked out wrongly. */
function withFigures(
  { publicCase }: Built,
  change: (figures: Figures, chain: readonly Part[], site: Site) => Figures,
): Answers {
  const site = siteIn(publicCase);
  const chain = bestChain(site)!;
  return answersFor(chain, change(figuresOf(chain, site), chain, site));
}

const withFirst = (
  built: Built,
  change: (first: Figures["amplifiers"][number], site: Site) => Figures["amplifiers"][number],
) =>
  withFigures(built, (figures, _, site) => {
    const [first, ...others] = figures.amplifiers;
    return { ...figures, amplifiers: [change(first, site), ...others] };
  });
