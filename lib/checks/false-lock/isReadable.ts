import { acquire, type Capture } from "@/lib/gnss/acquire";
import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { circularDifference } from "../circularDifference";
import { acceptedFalsePeaks, type FalseLockTruth } from "./drawScene";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { LARGEST_CELL_LOSS_DB, STRONG_FROM_DBHZ, unborrowedPeak } from "./unborrowedPeak";

// Of the tolerances of 50 Hz and 1.5 dB, so much may be used up by the noise of this capture.
export const LARGEST_OWN_ERROR_HZ = 30;
export const LARGEST_OWN_ERROR_DB = 1;
export const CLEAR_OF_WEAKEST_DB = 1;

/** Whether the false lock and the weak satellite, there or not, show in the capture as a right reading needs them. */
export function isReadable(truth: FalseLockTruth, capture: Capture): boolean {
  return falsePeakShows(truth, capture) && weakSatelliteShows(truth, capture);
}

function falsePeakShows(truth: FalseLockTruth, capture: Capture): boolean {
  const [search] = acquire(capture, { ...REFERENCE_SEARCH, prns: [truth.victimPrn] });
  return (
    search.found &&
    acceptedFalsePeaks(truth).some(
      ({ dopplerHz, apparentCn0DbHz }) =>
        Math.abs(search.dopplerHz - dopplerHz) <= LARGEST_OWN_ERROR_HZ &&
        Math.abs(search.cn0DbHz - apparentCn0DbHz) <= LARGEST_OWN_ERROR_DB,
    )
  );
}

function weakSatelliteShows({ scene, weakPrn, weakestDbHz }: FalseLockTruth, capture: Capture): boolean {
  const strong = scene.satellites.filter(({ cn0DbHz }) => cn0DbHz >= STRONG_FROM_DBHZ);
  const peak = unborrowedPeak(capture, weakPrn, REFERENCE_SEARCH, strong);
  const seenFrom = weakestDbHz - LARGEST_CELL_LOSS_DB;
  const signal = scene.satellites.find(({ prn }) => prn === weakPrn);
  if (!signal) return peak.cn0DbHz <= seenFrom - CLEAR_OF_WEAKEST_DB;
  const offChips = circularDifference(peak.codePhaseChips, signal.codePhaseChips, CA_LENGTH_CHIPS);
  return (
    peak.cn0DbHz >= seenFrom + CLEAR_OF_WEAKEST_DB / 2 &&
    Math.abs(peak.dopplerHz - signal.dopplerHz) <= REFERENCE_SEARCH.dopplerStepHz &&
    Math.abs(offChips) <= 1
  );
}
