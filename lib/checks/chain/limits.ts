import { figuresOf, type Figures } from "./figures";
import type { Part, Site } from "./site";

export const MARGIN_DB = 1; // to be left on every limit in dB

export type Margins = { gainDb: number; noiseDb: number; overloadDb: number };

/** What is left on each limit in dB; below 0 it is broken. */
export const marginsOf = ({ gainDb, noiseFigureDb, amplifiers }: Figures, site: Site): Margins => ({
  gainDb: Math.min(gainDb - site.gainFromDb, site.gainToDb - gainDb),
  noiseDb: site.noiseLimitDb - noiseFigureDb,
  overloadDb: Math.min(...amplifiers.map(({ headroomDb }) => headroomDb)),
});

export const leastMarginDb = (figures: Figures, site: Site): number =>
  Math.min(...Object.values(marginsOf(figures, site)));

/** What keeps the feed from every amplifier, or brings two feeds on one line; null when it is intact. */
export function feedFault(chain: readonly Part[], { amplifiers }: Figures): { part: Part | null; two: boolean } | null {
  if (amplifiers.length === 0) return { part: null, two: false };
  const first = chain.findIndex(({ kind }) => kind === "amplifier");
  const behind = chain.slice(first);
  const blocking = behind.find(
    (part) => (part.kind === "arrester" && !part.passesDc) || (part.kind === "splitter" && part.feed === "none"),
  );
  if (blocking) return { part: blocking, two: false };
  const doubling = chain.find((part) => part.kind === "splitter" && part.feed === "all");
  return doubling ? { part: doubling, two: true } : null;
}

/** Volts at every amplifier and current of the feed. */
export const isSupplied = ({ amplifiers, totalMa }: Figures, { limitMa }: Site): boolean =>
  totalMa <= limitMa && amplifiers.every(({ part, volts }) => volts !== null && volts >= part.minimumV);

/** Whether a chain keeps every limit with the margin that is asked. */
export function keepsAll(chain: readonly Part[], site: Site): boolean {
  const figures = figuresOf(chain, site);
  return feedFault(chain, figures) === null && isSupplied(figures, site) && leastMarginDb(figures, site) >= MARGIN_DB;
}
