import { chipsToMetres } from "@/lib/gnss/constants";
import type { Answers, PublicCase } from "../kind";
import { biasM, levelDb, readPeaks, type Peaks } from "./readPeaks";

const ON_MAIN_CHIPS = 0.1; // a loop at rest on a peak is nearer to its top than this

/** The right method, from what the technician sees: three tops, and which of them stands at the tracked lag. */
export const solve = (shown: PublicCase): Answers => answersFor(shown, peaksOf(shown));

export const peaksOf = ({ data }: PublicCase): Peaks =>
  readPeaks(data.trace as number[], data.fromChips as number, data.stepChips as number);

/** What follows from three tops, as a careful person writes it. */
export function answersFor({ data }: PublicCase, peaks: Peaks): Answers {
  const offsetChips = (data.trackedLagChips as number) - peaks.main.lagChips;
  return {
    "lock.peak": Math.abs(offsetChips) <= ON_MAIN_CHIPS ? "main" : "side",
    "lock.lag": peaks.main.lagChips.toFixed(3),
    "lock.bias": chipsToMetres(offsetChips).toFixed(1),
    "earlier.bias": biasM(peaks, "earlier").toFixed(1),
    "earlier.level": levelDb(peaks, "earlier").toFixed(1),
    "later.bias": biasM(peaks, "later").toFixed(1),
    "later.level": levelDb(peaks, "later").toFixed(1),
  };
}
