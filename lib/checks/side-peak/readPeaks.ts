import { chipsToMetres } from "@/lib/gnss/constants";
import { decibels } from "@/lib/numeric/elementary";

/** A peak of the trace. */
export type Peak = { lagChips: number; level: number };
export type Peaks = { main: Peak; earlier: Peak; later: Peak };
export type Side = "earlier" | "later";

/** Where the side peaks of BOC(1,1) are looked for, whatever filter and reflection make of them. */
export const NEAREST_SIDE_CHIPS = 0.3;
export const FARTHEST_SIDE_CHIPS = 0.8;

/** Three peaks of a magnitude: the highest of all, and the highest on either side of it, 0.3 to 0.8 chip away. */
export function readPeaks(trace: ArrayLike<number>, fromChips: number, stepChips: number): Peaks {
  const nearest = Math.round(NEAREST_SIDE_CHIPS / stepChips);
  const farthest = Math.round(FARTHEST_SIDE_CHIPS / stepChips);
  const main = highestOf(trace, 0, trace.length - 1);
  const peak = (cell: number): Peak => ({ lagChips: fromChips + cell * stepChips, level: trace[cell] });
  return {
    main: peak(main),
    earlier: peak(highestOf(trace, main - farthest, main - nearest)),
    later: peak(highestOf(trace, main + nearest, main + farthest)),
  };
}

function highestOf(trace: ArrayLike<number>, from: number, to: number): number {
  let highest = Math.max(0, from);
  for (let cell = highest + 1; cell <= Math.min(trace.length - 1, to); cell++) {
    if (trace[cell] > trace[highest]) highest = cell;
  }
  return highest;
}

/** Range error in m of a loop that rests on a side peak: positive behind the main peak, where the range comes out too long. */
export const biasM = (peaks: Peaks, side: Side): number => chipsToMetres(peaks[side].lagChips - peaks.main.lagChips);

/** Level of a side peak under the main peak in dB, positive; of magnitudes. */
export const levelDb = (peaks: Peaks, side: Side): number => 2 * decibels(peaks.main.level / peaks[side].level);
