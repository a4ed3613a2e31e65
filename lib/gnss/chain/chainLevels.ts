import { decibels, log10, pow10Db } from "@/lib/numeric/elementary";
import { cascade, noiseDensityDbmHz, systemTemperatureK, type ChainStage } from "../linkBudget";

/** One part between antenna and receiver. A passive part of x dB loss has gain -x and noise figure x. */
export type ChainPart = ChainStage & {
  /** Level at the part's output at which its gain is 1 dB down; null for a part that does not compress. */
  outputCompressionDbm: number | null;
};

/** What the antenna hands to the chain. */
export type ChainInput = {
  /** Noise temperature of the antenna, 50 to 290 K. */
  antennaK: number;
  /** A satellite's signal at the antenna's terminals. */
  signalDbm: number;
  /** A neighbour's signal at the antenna's terminals; null for none. */
  strongDbm: number | null;
};

/** Levels at the output of one part. */
export type ChainLevel = {
  /** From the antenna to here, uncompressed. */
  gainDb: number;
  noiseFigureDb: number;
  signalDbm: number;
  /** Noise density, antenna and parts together. */
  noiseDbmHz: number;
  cn0DbHz: number;
  /** null when there is no strong signal. */
  strongDbm: number | null;
  /**
   * From the strong signal up to the part's compression level; below 0 it is overdriven. Infinity when nothing
   * compresses.
   */
  headroomDb: number;
  /** Gain that the strong signal costs in this part. */
  compressionDb: number;
};

/**
 * Levels along a chain, antenna first: gain and noise figure by Friis (`cascade`), signal, noise density and C/N0 of a
 * satellite, and a strong neighbour's level against each part's compression point. What compresses the strong signal
 * takes the same gain from the weak one beside it; the noise of the parts behind then weighs more, which C/N0 shows.
 * @param parts from the antenna's terminals on, at least one
 */
export function chainLevels(parts: readonly ChainPart[], input: ChainInput): ChainLevel[] {
  if (parts.length === 0) throw new RangeError("chainLevels: at least one part");
  const stages: ChainStage[] = [];
  let plainGainDb = 0;
  let strongDbm = input.strongDbm;
  return parts.map((part) => {
    plainGainDb += part.gainDb;
    const driven = strongDbm === null ? null : strongDbm + part.gainDb;
    const headroomDb =
      driven === null || part.outputCompressionDbm === null ? Infinity : part.outputCompressionDbm - driven;
    const compressionDb = compressionOfHeadroomDb(headroomDb);
    if (driven !== null) strongDbm = driven - compressionDb;
    stages.push({ gainDb: part.gainDb - compressionDb, noiseFigureDb: part.noiseFigureDb });
    const whole = cascade(stages);
    const densityDbmHz = noiseDensityDbmHz(systemTemperatureK(input.antennaK, whole.noiseFigureDb));
    return {
      gainDb: plainGainDb,
      noiseFigureDb: whole.noiseFigureDb,
      signalDbm: input.signalDbm + whole.gainDb,
      noiseDbmHz: densityDbmHz + whole.gainDb,
      cn0DbHz: input.signalDbm - densityDbmHz,
      strongDbm,
      headroomDb,
      compressionDb,
    };
  });
}

/**
 * Gain lost in dB by an amplifier whose output, were it straight, would stand `headroomDb` below its 1 dB compression
 * level: 10 log10(1 + (10^0.1 - 1) 10^(-headroom/10)). Exactly 1 dB at the level itself and a firm ceiling far above;
 * the curve between is common practice, no source, and a data sheet's own curve wins.
 */
export function compressionOfHeadroomDb(headroomDb: number): number {
  if (headroomDb === Infinity) return 0;
  return decibels(1 + (pow10Db(1) - 1) * pow10Db(-headroomDb));
}

/** Level in dBm of several uncorrelated signals together. */
export const sumOfLevelsDbm = (levelsDbm: readonly number[]): number =>
  10 * log10(levelsDbm.reduce((sum, level) => sum + pow10Db(level), 0));
