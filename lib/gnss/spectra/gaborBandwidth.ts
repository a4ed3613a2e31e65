import { pow10Db, PI } from "@/lib/numeric/elementary";
import { integrateBand } from "./integrateBand";
import type { Modulation } from "./modulation";
import { powerInBand } from "./powerInBand";
import { powerSpectralDensity } from "./powerSpectralDensity";

/**
 * Root-mean-square bandwidth in Hz of a signal behind an ideal filter, sqrt(int f^2 G / int G) over +-B/2. The wider it
 * is, the finer a delay can be read. Gabor (1946); for navigation signals Betz, Navigation 48(4), 2001.
 */
export function gaborBandwidthHz(modulation: Modulation, bandwidthHz: number): number {
  const weighed = (offsetHz: number) => offsetHz * offsetHz * powerSpectralDensity(modulation, offsetHz);
  return Math.sqrt(integrateBand(weighed, bandwidthHz, [modulation]) / powerInBand(modulation, bandwidthHz));
}

/**
 * Least standard deviation in s that any code loop can reach, sqrt(Bn/(C/N0))/(2 pi beta): Cramer-Rao bound as given by
 * Betz (2001). C/N0 counts the power inside the band.
 */
export const leastDelayDeviationS = (
  modulation: Modulation,
  bandwidthHz: number,
  loopHz: number,
  cn0DbHz: number,
): number => Math.sqrt(loopHz / pow10Db(cn0DbHz)) / (2 * PI * gaborBandwidthHz(modulation, bandwidthHz));
