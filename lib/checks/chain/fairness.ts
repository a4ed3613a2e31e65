import { figuresOf } from "./figures";
import { feedFault, leastMarginDb, marginsOf, MARGIN_DB } from "./limits";
import { bestChain, countChains, goodChains } from "./possibleChains";
import type { Part, Site } from "./site";
import { amplifiersInRack, leastLoss, mostGain } from "./wrongChains";
import { delayLeftOutNs, lossLeftOutDb, noiseFiguresAddedDb } from "./wrongFigures";

const LEAST_GOOD_CHAINS = 2;
const MOST_GOOD_SHARE = 0.05;
const BEST_MARGIN_DB = 1.3; // so that the best chain stays good whatever is rounded
// Each above its quantity's tolerance, so that the wrong figure is seen to be one.
const CLEAR_DB = 0.4;
const CLEAR_VOLTS = 0.08;
const CLEAR_SHARE_OF_DELAY = 0.015;
const CLEAR_NS = 1.5;

export type Fairness = { best: Part[]; goodChains: number; possibleChains: number };

/** The site's best chain and how many are good; null where hardly any or too many are, or a wrong method comes out right. */
export function fairness(site: Site): Fairness | null {
  const good = goodChains(site);
  const best = bestChain(site, good);
  if (!best || good.length < LEAST_GOOD_CHAINS) return null;
  const possible = countChains(site);
  if (good.length > MOST_GOOD_SHARE * possible) return null;
  const fair =
    leastMarginDb(figuresOf(best, site), site) >= BEST_MARGIN_DB &&
    wrongChainsFail(best, site) &&
    wrongFiguresShow(best, site);
  return fair ? { best, goodChains: good.length, possibleChains: possible } : null;
}

function wrongChainsFail(best: readonly Part[], site: Site): boolean {
  const margins = (chain: readonly Part[]) => marginsOf(figuresOf(chain, site), site);
  const blind = leastLoss(best, site);
  return (
    margins(amplifiersInRack(best)).noiseDb <= MARGIN_DB - CLEAR_DB &&
    margins(mostGain(best, site)).gainDb <= MARGIN_DB - CLEAR_DB &&
    feedFault(blind, figuresOf(blind, site)) !== null
  );
}

function wrongFiguresShow(best: readonly Part[], site: Site): boolean {
  const { amplifiers, delayNs, noiseFigureDb } = figuresOf(best, site);
  const delayOffNs = delayLeftOutNs(best, site);
  return (
    lossLeftOutDb(best, site) >= CLEAR_DB &&
    noiseFiguresAddedDb(best, site) - noiseFigureDb >= CLEAR_DB &&
    site.supplyV - amplifiers[0].volts! >= CLEAR_VOLTS &&
    delayOffNs >= CLEAR_NS &&
    delayOffNs >= CLEAR_SHARE_OF_DELAY * delayNs
  );
}
