import type { Part, Site } from "@/lib/checks/chain/site";

/** A site whose figures are easy to work by hand. */
export const SITE: Site = {
  runM: 100,
  needsSplitter: true,
  neighbourDbm: -30,
  gainFromDb: 8,
  gainToDb: 24,
  noiseLimitDb: 5,
  receiverNoiseDb: 8,
  supplyV: 5,
  limitMa: 60,
  sourceOhm: 10,
  parts: [
    amplifier("A1", 26, 2, 5, 40, 4),
    amplifier("A2", 20, 5, 10, 30, 3.5),
    { kind: "cable", id: "C1", dbPer100M: 9.5606, loopOhmPerKm: 20, velocityFactor: 0.85 },
    { kind: "arrester", id: "S1", lossDb: 0.5, passesDc: true, ohm: 0.5, delayNs: 0.5 },
    { kind: "arrester", id: "S2", lossDb: 0.1, passesDc: false, ohm: 0, delayNs: 0.5 },
    { kind: "splitter", id: "D1", lossDb: 4, feed: "one", ohm: 0.5, delayNs: 1 },
    { kind: "splitter", id: "D2", lossDb: 3.6, feed: "all", ohm: 0.5, delayNs: 1 },
  ],
};

function amplifier(
  id: string,
  gainDb: number,
  noiseFigureDb: number,
  compressionDbm: number,
  currentMa: number,
  minimumV: number,
): Part {
  return { kind: "amplifier", id, gainDb, noiseFigureDb, compressionDbm, currentMa, minimumV, delayNs: 20 };
}

export const named = (...ids: string[]): Part[] => ids.map((id) => SITE.parts.find((part) => part.id === id)!);
