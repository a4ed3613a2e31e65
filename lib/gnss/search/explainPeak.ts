import { decibels } from "@/lib/numeric/elementary";
import { CA_CHIP_RATE_HZ } from "../constants";
import { dopplerCorrelation } from "../crossCorrelation";
import type { SearchSignal } from "./searchSignal";

/** Where a satellite stands in a search. */
export type PeakPlace = { prn: number; codePhaseChips: number; dopplerHz: number; cn0DbHz: number };

/** The strong satellite that accounts for a peak in another one's grid. */
export type PeakExplanation = {
  parentPrn: number;
  /** Doppler of the peak minus that of the parent; codes that repeat F times a second meet at multiples of F. */
  dopplerDifferenceHz: number;
  /** Code phase of the peak minus that of the parent, 0 to below the code's length. */
  lagChips: number;
  /** Level of the two codes' correlation there against the parent's own peak. */
  levelDb: number;
  /** C/N0 that the parent alone gives the peak. */
  apparentCn0DbHz: number;
};

/**
 * Which of the strong satellites raises the highest false peak at a place in another one's grid, by the correlation of the
 * two codes at that Doppler difference over the coherent time; the larger of the two whole lags around the place counts.
 * @returns null without a parent
 */
export function explainPeak(
  signal: SearchSignal,
  parents: readonly PeakPlace[],
  peak: PeakPlace,
  coherentS: number,
): PeakExplanation | null {
  let best: PeakExplanation | null = null;
  for (const parent of parents) {
    if (parent.prn === peak.prn) continue;
    const found = explainBy(signal, parent, peak, coherentS);
    if (!best || found.apparentCn0DbHz > best.apparentCn0DbHz) best = found;
  }
  return best;
}

function explainBy(signal: SearchSignal, parent: PeakPlace, peak: PeakPlace, coherentS: number): PeakExplanation {
  const { lengthChips, chipRateHz } = signal;
  const dopplerDifferenceHz = peak.dopplerHz - parent.dopplerHz;
  const difference = peak.codePhaseChips - parent.codePhaseChips;
  const lagChips = difference - lengthChips * Math.floor(difference / lengthChips);
  // That function counts in C/A chips; other rates are the same sum at a scaled frequency.
  const scale = CA_CHIP_RATE_HZ / chipRateHz;
  const levels = dopplerCorrelation(
    signal.chips(parent.prn),
    signal.chips(peak.prn),
    -dopplerDifferenceHz * scale,
    coherentS / scale,
  );
  const below = Math.floor(lagChips);
  const level = Math.max(levels[below % lengthChips], levels[(below + 1) % lengthChips]);
  const levelDb = level > 0 ? 2 * decibels(level / lengthChips) : -Infinity;
  return {
    parentPrn: parent.prn,
    dopplerDifferenceHz,
    lagChips,
    levelDb,
    apparentCn0DbHz: parent.cn0DbHz + levelDb,
  };
}
