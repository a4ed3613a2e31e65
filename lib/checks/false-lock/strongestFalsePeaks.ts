import { falsePeaks } from "@/lib/gnss/falseLock";
import { REFERENCE_SEARCH } from "./referenceSearch";

/** A place where a false peak counts as found; one for each Doppler. */
export type FalsePeakPlace = { dopplerHz: number; levelDb: number; apparentCn0DbHz: number };

/** Several false peaks are nearly as high as the highest, and noise decides between them: all within 1 dB are right. */
export const EQUAL_WITHIN_DB = 1;

export type Parent = { prn: number; dopplerHz: number; cn0DbHz: number };

/**
 * The highest false peak of a victim's search at each Doppler, highest first, as far as 3 dB under the highest. The code
 * phase of a peak is not asked, so peaks at one Doppler are one place.
 */
export function strongestFalsePeaks(parent: Parent, victimPrn: number): FalsePeakPlace[] {
  const peaks = falsePeaks({
    parentPrn: parent.prn,
    victimPrn,
    parentDopplerHz: parent.dopplerHz,
    parentCn0DbHz: parent.cn0DbHz,
    coherentMs: REFERENCE_SEARCH.coherentMs,
    sums: REFERENCE_SEARCH.sums,
    dopplerHalfWidthHz: REFERENCE_SEARCH.dopplerHalfWidthHz,
  });
  const places = new Map<number, FalsePeakPlace>();
  for (const { dopplerHz, levelDb, apparentCn0DbHz } of peaks) {
    if (!places.has(dopplerHz)) places.set(dopplerHz, { dopplerHz, levelDb, apparentCn0DbHz });
  }
  return [...places.values()];
}
