import { decibels, log10, pow10 } from "@/lib/numeric/elementary";
import { freeSpaceLossDb } from "../linkBudget";

/** A transmitter and the way from it to the antenna. */
export type InterferencePath = {
  /** Effective radiated power against an isotropic antenna. */
  eirpDbm: number;
  frequencyHz: number;
  /** 2 in free space, 3 to 4 along the ground between buildings (common practice, no source). */
  exponent: number;
  /** Walls, hills, choke rings: what stands between. */
  screenDb: number;
  /** Of the receiving antenna towards the transmitter. */
  antennaGainDb: number;
};

const NEAREST_M = 1; // up to here free space, beyond with the exponent

/**
 * Path loss in dB: free space to 1 m, then 10 n dB per tenfold distance, and the screen. Log-distance law; textbook.
 */
export function pathLossDb({ frequencyHz, exponent, screenDb }: InterferencePath, distanceM: number): number {
  checkDistance(distanceM);
  return freeSpaceLossDb(NEAREST_M, frequencyHz) + exponent * decibels(distanceM / NEAREST_M) + screenDb;
}

/** Power in dBm of the interference at the antenna's terminals. */
export const receivedDbm = (path: InterferencePath, distanceM: number): number =>
  path.eirpDbm + path.antennaGainDb - pathLossDb(path, distanceM);

/** Distance in m at which the interference has fallen to a power; 1 m when it is below that already there. */
export function distanceOfPowerM(path: InterferencePath, powerDbm: number): number {
  if (!(path.exponent > 0)) throw new RangeError(`distanceOfPowerM: exponent above 0, got ${path.exponent}`);
  const excessDb = receivedDbm(path, NEAREST_M) - powerDbm;
  return excessDb <= 0 ? NEAREST_M : NEAREST_M * pow10(excessDb / (10 * path.exponent));
}

/** Power in dBm of an EIRP in mW. */
export const milliwattsToDbm = (milliwatts: number): number => 10 * log10(milliwatts);

function checkDistance(distanceM: number): void {
  if (!(distanceM >= NEAREST_M)) throw new RangeError(`pathLossDb: distance from ${NEAREST_M} m, got ${distanceM}`);
}
