import { cableDelayNs } from "@/lib/gnss/chain/cableDelay";
import { cableLossDb, fitCableLoss } from "@/lib/gnss/chain/cableLoss";
import type { ChainPart } from "@/lib/gnss/chain/chainLevels";
import { loopResistanceOhm, type DcPart } from "@/lib/gnss/chain/dcFeed";
import { L1_HZ } from "@/lib/gnss/constants";

export type Amplifier = {
  kind: "amplifier";
  id: string;
  gainDb: number;
  noiseFigureDb: number;
  /** At the output. */
  compressionDbm: number;
  currentMa: number;
  minimumV: number;
  delayNs: number;
};
/** A cable by its sheet; the run is cut from it. */
export type Cable = {
  kind: "cable";
  id: string;
  /** At 1 GHz. */
  dbPer100M: number;
  loopOhmPerKm: number;
  velocityFactor: number;
};
export type Arrester = {
  kind: "arrester";
  id: string;
  lossDb: number;
  passesDc: boolean;
  ohm: number;
  delayNs: number;
};
export type Splitter = {
  kind: "splitter";
  id: string;
  lossDb: number;
  feed: SplitterFeed;
  ohm: number;
  delayNs: number;
};
/** Which receivers' feed gets through towards the antenna: that of one port, those of all, none. */
export type SplitterFeed = "one" | "all" | "none";
export type Part = Amplifier | Cable | Arrester | Splitter;

/** Where a chain is to work, and the parts at hand. */
export type Surroundings = {
  runM: number;
  /** A second receiver, which feeds its port as well, is to be served. */
  needsSplitter: boolean;
  /** At the antenna's terminals. */
  neighbourDbm: number;
  receiverNoiseDb: number;
  supplyV: number;
  limitMa: number;
  sourceOhm: number;
  parts: Part[];
};

/** What a chain is designed for. */
export type Site = Surroundings & {
  gainFromDb: number;
  gainToDb: number;
  /** Of chain and receiver together. */
  noiseLimitDb: number;
};

const SHEET_HZ = 1e9;

/** Loss of the run at L1. */
export const runLossDb = (cable: Cable, runM: number): number =>
  cableLossDb(fitCableLoss([{ frequencyHz: SHEET_HZ, dbPer100M: cable.dbPer100M }]), runM, L1_HZ);

export function stageOf(part: Part, { runM }: Surroundings): ChainPart {
  if (part.kind === "amplifier")
    return { gainDb: part.gainDb, noiseFigureDb: part.noiseFigureDb, outputCompressionDbm: part.compressionDbm };
  const lossDb = part.kind === "cable" ? runLossDb(part, runM) : part.lossDb;
  return { gainDb: -lossDb, noiseFigureDb: lossDb, outputCompressionDbm: null };
}

export function dcPartOf(part: Part, { runM }: Surroundings): DcPart {
  const passive = { currentMa: 0, minimumV: 0, passesDc: true };
  switch (part.kind) {
    case "amplifier":
      return { currentMa: part.currentMa, minimumV: part.minimumV, resistanceOhm: 0, passesDc: true };
    case "cable":
      return { ...passive, resistanceOhm: loopResistanceOhm(runM, part.loopOhmPerKm, 0) };
    case "arrester":
      return { ...passive, resistanceOhm: part.ohm, passesDc: part.passesDc };
    case "splitter":
      return { ...passive, resistanceOhm: part.ohm, passesDc: part.feed !== "none" };
  }
}

export const delayOfNs = (part: Part, { runM }: Surroundings): number =>
  part.kind === "cable" ? cableDelayNs(runM, part.velocityFactor) : part.delayNs;
