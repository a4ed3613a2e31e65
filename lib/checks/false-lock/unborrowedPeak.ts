import { searchGrid, type Capture, type SearchSettings } from "@/lib/gnss/acquire";
import { decibels } from "@/lib/numeric/elementary";
import { offWholeKilohertz } from "./offWholeKilohertz";

export type GridPeak = { dopplerHz: number; codePhaseChips: number; cn0DbHz: number };

/** A satellite strong enough to be seen through other codes. */
export type Strong = { dopplerHz: number; cn0DbHz: number };

export const STRONG_FROM_DBHZ = 42; // false peaks of weaker ones stay under 22 dB-Hz
/** What a cell may lose against the signal in it: half a bin, half a cell and data bits. */
export const LARGEST_CELL_LOSS_DB = 2.5;
const PARENT_FROM_DBHZ = 47;
const CLEAR_OF_PARENT_HZ = 160; // data bits spread its false peaks over 100 Hz to either side, and a bin is 50 Hz
const CLEAR_OF_STRONG_HZ = 75;

/** Highest cell of a satellite's grid in the rows where no strong satellite can put a false peak; C/N0 as the cell stands. */
export function unborrowedPeak(
  capture: Capture,
  prn: number,
  settings: SearchSettings,
  strong: readonly Strong[],
): GridPeak {
  const { dopplersHz, lagsChips, power } = searchGrid(capture, prn, settings);
  const lags = lagsChips.length;
  let best = -1;
  dopplersHz.forEach((dopplerHz, row) => {
    if (!strong.every((other) => offWholeKilohertz(dopplerHz, other.dopplerHz) > clearOf(other))) return;
    for (let cell = row * lags; cell < (row + 1) * lags; cell++) if (best < 0 || power[cell] > power[best]) best = cell;
  });
  const excess = Math.max(1e-3, power[best] - 1); // noise = 1
  return {
    dopplerHz: dopplersHz[Math.floor(best / lags)],
    codePhaseChips: lagsChips[best % lags],
    cn0DbHz: decibels((excess * 1000) / settings.coherentMs),
  };
}

const clearOf = ({ cn0DbHz }: Strong) => (cn0DbHz >= PARENT_FROM_DBHZ ? CLEAR_OF_PARENT_HZ : CLEAR_OF_STRONG_HZ);
