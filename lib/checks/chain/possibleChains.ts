import { cascade } from "@/lib/gnss/linkBudget";
import { keepsAll, leastMarginDb } from "./limits";
import { figuresOf } from "./figures";
import { stageOf, type Part, type Site } from "./site";

const kindOfPart = <K extends Part["kind"]>(site: Site, kind: K) =>
  site.parts.filter((part): part is Extract<Part, { kind: K }> => part.kind === kind);

type Arrangement = { top: Part[]; beforeSplit: Part[]; afterSplit: Part[] };

/** One amplifier or two, at the antenna or in the building. */
function arrangements(site: Site): Arrangement[] {
  const amplifiers = kindOfPart(site, "amplifier");
  const places = site.needsSplitter
    ? (["top", "beforeSplit", "afterSplit"] as const)
    : (["top", "beforeSplit"] as const);
  const found: Arrangement[] = [];
  const at = (...put: (readonly [(typeof places)[number], Part])[]) => {
    const one: Arrangement = { top: [], beforeSplit: [], afterSplit: [] };
    for (const [place, part] of put) one[place].push(part);
    found.push(one);
  };
  for (const [n, place] of places.entries())
    for (const first of amplifiers) {
      at([place, first]);
      for (const second of amplifiers)
        if (second !== first) for (const later of places.slice(n)) at([place, first], [later, second]);
    }
  return found;
}

/** Chains with one amplifier or two whose parts stand in order and let one feed through. */
export function possibleChains(site: Site): Part[][] {
  const splitters = kindOfPart(site, "splitter").filter(({ feed }) => feed === "one");
  const entries = kindOfPart(site, "arrester").filter(({ passesDc }) => passesDc);
  const ends: Part[][] = site.needsSplitter ? splitters.map((one) => [one]) : [[]];
  return kindOfPart(site, "cable").flatMap((cable) =>
    entries.flatMap((arrester) =>
      ends.flatMap((splitter) =>
        arrangements(site).map(({ top, beforeSplit, afterSplit }) => [
          ...top,
          cable,
          arrester,
          ...beforeSplit,
          ...splitter,
          ...afterSplit,
        ]),
      ),
    ),
  );
}

/** How many chains there are with one amplifier or two, fed or not. */
export function countChains(site: Site): number {
  const splitters = site.needsSplitter ? kindOfPart(site, "splitter").length : 1;
  const others = kindOfPart(site, "cable").length * kindOfPart(site, "arrester").length * splitters;
  return others * arrangements(site).length;
}

/** Chains that keep every limit. Net gain is a sum and noise one formula, so most are left out before the rest is worked out. */
export function goodChains(site: Site): Part[][] {
  const stages = new Map(site.parts.map((part) => [part, stageOf(part, site)]));
  const receiver = { gainDb: 0, noiseFigureDb: site.receiverNoiseDb };
  return possibleChains(site).filter((chain) => {
    const own = chain.map((part) => stages.get(part)!);
    const netDb = own.reduce((sum, { gainDb }) => sum + gainDb, 0);
    return (
      netDb > site.gainFromDb &&
      netDb < site.gainToDb &&
      cascade([...own, receiver]).noiseFigureDb < site.noiseLimitDb &&
      keepsAll(chain, site)
    );
  });
}

/** Of the good chains the one with most left on its tightest limit; null when there is none. */
export function bestChain(site: Site, good = goodChains(site)): Part[] | null {
  let best: { chain: Part[]; marginDb: number } | null = null;
  for (const chain of good) {
    const marginDb = leastMarginDb(figuresOf(chain, site), site);
    if (!best || marginDb > best.marginDb) best = { chain, marginDb };
  }
  return best?.chain ?? null;
}
