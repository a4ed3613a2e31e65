import { signalLines } from "../signalLines";
import type { SearchBand } from "./searchBand";
import type { SearchSignal } from "./searchSignal";

/** A code as the search multiplies it. */
export type CodeReplica = {
  prn: number;
  /** Conjugate lines in the order of a transform of `lags` points: 0 to highest, a gap, -highest to -1. */
  conjugateLines: Float64Array;
  /** Share of the code's power inside the band of the search. */
  power: number;
};

const made = new WeakMap<SearchSignal, Map<string, CodeReplica>>();
const MOST_KEPT = 64; // of a signal; 32 kB each for C/A

/** A code's replica in a band. Shared between callers: do not write into it. */
export function codeReplica(signal: SearchSignal, prn: number, band: SearchBand): CodeReplica {
  const known = made.get(signal) ?? new Map<string, CodeReplica>();
  made.set(signal, known);
  const key = `${prn}/${band.highest}/${band.lags}`;
  const replica = known.get(key) ?? makeReplica(signal, prn, band);
  if (known.size >= MOST_KEPT) known.clear();
  known.set(key, replica);
  return replica;
}

function makeReplica(signal: SearchSignal, prn: number, { highest, lags }: SearchBand): CodeReplica {
  const lines = signalLines(signal.chips(prn), signal.halvesPerChip, highest);
  const conjugateLines = new Float64Array(2 * lags);
  let power = 0;
  for (let k = 0; k <= highest; k++) {
    const re = lines[2 * k];
    const im = lines[2 * k + 1];
    conjugateLines[2 * k] = re;
    conjugateLines[2 * k + 1] = -im;
    if (k > 0) {
      conjugateLines[2 * (lags - k)] = re;
      conjugateLines[2 * (lags - k) + 1] = im;
    }
    power += (k > 0 ? 2 : 1) * (re * re + im * im);
  }
  return { prn, conjugateLines, power };
}
