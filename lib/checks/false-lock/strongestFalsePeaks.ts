import { highestLineInBand } from "@/lib/gnss/bandLimitedCode";
import { codeHarmonics } from "@/lib/gnss/codeHarmonics";
import { samplesPerCodePeriod } from "@/lib/gnss/doppler";
import { createFft } from "@/lib/numeric/fft";
import { decibels } from "@/lib/numeric/elementary";
import { REFERENCE_SEARCH } from "./referenceSearch";

/** A place where a false peak counts as found; one for each Doppler. */
export type FalsePeakPlace = { dopplerHz: number; levelDb: number; apparentCn0DbHz: number };

/** Several false peaks are nearly as high as the highest, and noise decides between them: all within 1 dB are right. */
export const EQUAL_WITHIN_DB = 1;

export type Parent = { prn: number; dopplerHz: number; cn0DbHz: number };

const LAGS = 4096; // a quarter of a chip
const LINE_SPACING_HZ = 1000; // both codes repeat each millisecond
const WITHIN_DB = 3; // of the highest: what lies below is not what a search shows as its peak

/**
 * The highest false peak at each Doppler in the search for a victim, highest first, as far as 3 dB under the highest. As
 * `falsePeaks` of the engine, but of the codes as they are in the capture, behind its filter and at lags between whole
 * chips: two equal neighbours of the chip-by-chip correlation make a peak up to 2 dB higher between them.
 */
export function strongestFalsePeaks(parent: Parent, victimPrn: number, rateHz: number): FalsePeakPlace[] {
  const highestLine = highestLineInBand(samplesPerCodePeriod(rateHz));
  const parentLines = unitPowerLines(parent.prn, highestLine);
  const victimLines = unitPowerLines(victimPrn, highestLine);
  const { dopplerHalfWidthHz } = REFERENCE_SEARCH;
  const lowest = Math.ceil((-dopplerHalfWidthHz - parent.dopplerHz) / LINE_SPACING_HZ);
  const highest = Math.floor((dopplerHalfWidthHz - parent.dopplerHz) / LINE_SPACING_HZ);
  const places = Array.from({ length: highest - lowest + 1 }, (_, n): FalsePeakPlace => {
    const levelDb = decibels(highestPower(parentLines, victimLines, highestLine, lowest + n));
    return {
      dopplerHz: parent.dopplerHz + (lowest + n) * LINE_SPACING_HZ,
      levelDb,
      apparentCn0DbHz: parent.cn0DbHz + levelDb,
    };
  }).sort((a, b) => b.levelDb - a.levelDb || a.dopplerHz - b.dopplerHz);
  return places.filter(({ levelDb }) => levelDb >= places[0].levelDb - WITHIN_DB);
}

/** Complex lines from -highest to +highest, in that order, of total power 1. */
function unitPowerLines(prn: number, highest: number): Float64Array {
  const half = codeHarmonics(prn, highest);
  const lines = new Float64Array(2 * (2 * highest + 1));
  let power = 0;
  for (let k = 0; k <= highest; k++) {
    const [re, im] = [half[2 * k], half[2 * k + 1]];
    lines.set([re, im], 2 * (highest + k));
    lines.set([re, k === 0 ? im : -im], 2 * (highest - k));
    power += (k === 0 ? 1 : 2) * (re * re + im * im);
  }
  return lines.map((value) => value / Math.sqrt(power));
}

/**
 * Largest |correlation|^2 over all lags when the replica's Doppler is `shift` lines above the parent's: the parent's line k
 * then meets the replica's line k - shift, and the lags are the transform of their products.
 */
function highestPower(parent: Float64Array, victim: Float64Array, highest: number, shift: number): number {
  const products = new Float64Array(2 * LAGS);
  for (let k = -highest; k <= highest; k++) {
    const met = k - shift;
    if (Math.abs(met) > highest) continue;
    const a = 2 * (k + highest);
    const b = 2 * (met + highest);
    const at = 2 * ((met + LAGS) % LAGS);
    products[at] = parent[a] * victim[b] + parent[a + 1] * victim[b + 1];
    products[at + 1] = parent[a + 1] * victim[b] - parent[a] * victim[b + 1];
  }
  const correlation = new Float64Array(2 * LAGS);
  createFft(LAGS).transform(correlation, products);
  let top = 0;
  for (let n = 0; n < 2 * LAGS; n += 2) {
    top = Math.max(top, correlation[n] * correlation[n] + correlation[n + 1] * correlation[n + 1]);
  }
  return top;
}
