import { seededRandom, type Random } from "@/lib/numeric/random";
import { between } from "../drawSatellite";
import { drawAmplifiers, drawArresters, drawCables, drawSplitters } from "./drawParts";
import { figuresOf } from "./figures";
import { fairness } from "./fairness";
import { MARGIN_DB } from "./limits";
import type { ChainParameters } from "./parameters";
import type { Part, Site, Surroundings } from "./site";

export type ChainTruth = {
  site: Site;
  /** The chain with most left on its tightest limit. */
  best: Part[];
  goodChains: number;
  possibleChains: number;
};
export type DrawnCase = { truth: ChainTruth; draws: number };

const LEAST_GAIN_DB = 8; // at the lower end of a receiver's window; common practice, no source
const SUPPLIES_V = [3.3, 5, 5, 12] as const;

/** Draws a site that few of the possible chains suit, and none that a named wrong method comes to. */
export function drawCase(seedHex: string, parameters: ChainParameters): DrawnCase {
  const first = seededRandom(seedHex, "chain@1/case");
  const needsSplitter = first.uniform() * 100 < parameters.splitter; // before the draws, so that refusing does not move the share
  for (let draws = 1; draws <= 500; draws++) {
    const random = seededRandom(seedHex, `chain@1/draw-${draws}`);
    const site = drawSite(needsSplitter, parameters, random);
    const fair = site && fairness(site);
    if (fair) return { truth: { site, ...fair }, draws };
  }
  throw new Error("chain: no fair site in 500 draws");
}

/** A site round one chain that suits it: the amplifier that fits at the antenna and no thicker a cable than it takes. */
function drawSite(needsSplitter: boolean, { run, neighbour }: ChainParameters, random: Random): Site | null {
  const supplyV = random.pick(SUPPLIES_V);
  const runM = random.integer(...run);
  const neighbourDbm = random.integer(...neighbour);
  const [amplifier, ...otherAmplifiers] = drawAmplifiers(supplyV, neighbourDbm, random);
  const cables = drawCables(runM, random);
  const arresters = drawArresters(random);
  const splitters = needsSplitter ? drawSplitters(random) : [];
  const bare: Surroundings = {
    runM,
    needsSplitter,
    neighbourDbm,
    receiverNoiseDb: random.integer(50, 110) / 10,
    supplyV,
    limitMa: 5 * Math.ceil((amplifier.currentMa + between(random, 8, 30)) / 5),
    sourceOhm: random.integer(20, 120) / 10,
    parts: [amplifier, ...otherAmplifiers, ...cables, ...arresters, ...splitters].sort((a, b) =>
      a.id < b.id ? -1 : 1,
    ),
  };
  const behind = [arresters.find(({ passesDc }) => passesDc)!, ...splitters.filter(({ feed }) => feed === "one")];
  const middling = [...cables].sort((a, b) => a.dbPer100M - b.dbPer100M).slice(0, Math.ceil(cables.length / 2));
  for (const cable of middling.reverse()) {
    const site = withLimits(bare, [amplifier, cable, ...behind], random);
    if (site.gainFromDb >= LEAST_GAIN_DB) return site;
  }
  return null;
}

/** Limits that the chain keeps with the margin and not much more. */
function withLimits(bare: Surroundings, chain: readonly Part[], random: Random): Site {
  const { gainDb, noiseFigureDb } = figuresOf(chain, bare);
  const gainFromDb = Math.floor(gainDb - MARGIN_DB - between(random, 0.5, 4));
  return {
    ...bare,
    gainFromDb,
    gainToDb: gainFromDb + random.integer(9, 16),
    noiseLimitDb: Math.ceil((noiseFigureDb + MARGIN_DB + between(random, 0.3, 1)) * 10) / 10,
  };
}
