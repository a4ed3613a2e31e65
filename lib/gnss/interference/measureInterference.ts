import { chiSquareInverseSurvival } from "@/lib/numeric/chiSquare";
import { decibels, pow10Db } from "@/lib/numeric/elementary";
import { median } from "@/lib/numeric/statistics";
import type { Spectrum } from "./spectrum";

/** What stands out of a spectrum's floor. */
export type InterferenceReading = {
  /** Density of the floor, squared units of the samples per Hz. */
  floorPerHz: number;
  /** Power above the floor, whole band; not below 0. */
  power: number;
  /** That power over the floor's density. */
  powerToDensityDbHz: number;
  peakOffsetHz: number;
  /** Highest bin over the floor. */
  peakOverFloorDb: number;
  /** Width of the stretch that holds all but half a per cent of that power at either end. */
  occupiedHz: number;
  centreHz: number;
};

const LEFT_OUT = 0.005; // at either end: the 99 % bandwidth of ITU-R SM.328
const CERTAIN = 5; // standard deviations of a bin above the floor

/**
 * Interference in a spectrum. The floor is the median of the bins, set right for the law of the averages (chi-square of
 * two degrees per transform), which holds as long as the interference fills less than half of the band.
 * @param floorPerHz where it is known otherwise, for an interference that fills the band
 */
export function measureInterference(spectrum: Spectrum, floorPerHz?: number): InterferenceReading {
  const { offsetsHz, densityPerHz, averaged } = spectrum;
  const binHz = offsetsHz[1] - offsetsHz[0];
  const floor = floorPerHz ?? median(densityPerHz) / (chiSquareInverseSurvival(0.5, 2 * averaged) / (2 * averaged));
  const excess = densityPerHz.map((density) => (density - floor) * binHz);
  const power = Math.max(
    0,
    excess.reduce((sum, value) => sum + value, 0),
  );
  const peak = densityPerHz.reduce((best, density, k) => (density > densityPerHz[best] ? k : best), 0);
  const certain = (CERTAIN * floor * binHz) / Math.sqrt(averaged); // the rest is the floor's own scatter
  const [from, to] = occupied(excess.map((value) => (value > certain ? value : 0)));
  return {
    floorPerHz: floor,
    power,
    powerToDensityDbHz: decibels(power / floor),
    peakOffsetHz: offsetsHz[peak],
    peakOverFloorDb: decibels(densityPerHz[peak] / floor),
    occupiedHz: (to - from + 1) * binHz,
    centreHz: (offsetsHz[from] + offsetsHz[to]) / 2,
  };
}

/** Bins between which the power lies, but for half a per cent below and above. */
function occupied(excess: Float64Array): [number, number] {
  const power = excess.reduce((total, value) => total + value, 0);
  let [from, to] = [0, excess.length - 1];
  let sum = 0;
  for (; from < to && sum + excess[from] < LEFT_OUT * power; from++) sum += excess[from];
  sum = 0;
  for (; to > from && sum + excess[to] < LEFT_OUT * power; to--) sum += excess[to];
  return [from, to];
}

/** J/S in dB of an interference whose power to noise density is read, for a signal of known C/N0. Definition. */
export const jsOfReadingDb = (powerToDensityDbHz: number, cn0DbHz: number): number => powerToDensityDbHz - cn0DbHz;

/**
 * Power per complex sample that stands J/S above a signal of C/N0, in squared units of the noise: J/S times C/N0 times
 * 2 sigma^2 over the rate. Definition.
 * @param sigma standard deviation of the noise in I or Q
 */
export const powerOfJs = (jsDb: number, cn0DbHz: number, sigma: number, rateHz: number): number =>
  (pow10Db(jsDb + cn0DbHz) * 2 * sigma * sigma) / rateHz;
