import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import { createProductPower } from "@/lib/numeric/productPower";
import type { CodeReplica } from "./codeReplica";
import type { TunedLines } from "./createReceivedLines";
import type { SearchBand } from "./searchBand";
import type { SearchPlanInForce } from "./searchPlanOf";
import { codeDriftChipsPerS, lineSpacingHz, type SearchSignal } from "./searchSignal";

/** The highest cell of one satellite's grid. */
export type HighestCell = {
  prn: number;
  /** Code phase at the first sample of the capture. */
  codePhaseChips: number;
  dopplerHz: number;
  /** Power of the cell, mean noise = 1. */
  peak: number;
  /** Mean noise power of a cell of the grid, in squared units of the samples. */
  cellNoise: number;
};

const SUMS_AT_ONCE = 16; // spectra of so many sums are held while the codes go over them
const MOST_POWER_BYTES = 32e6;

/**
 * Searches every Doppler row and every code phase for all codes. Rows that differ by whole line spacings have the same
 * received lines, only shifted against the code's; they are computed once and serve every satellite. Memory does not grow
 * with the number of sums.
 * The noise of a grid is the median over its rows of their mean power, which a signal in a few rows does not move.
 * @param received lines of the plan's sums, reaching as far as its Dopplers
 * @param onProgress called after each Doppler row, with the share of the work done
 * @param onRow given each finished row of each replica's grid; `places` says which code phase stands where, and the next row
 *   is written over it
 * @returns one cell per replica, in that order
 */
export function searchCells(
  received: (dopplerHz: number) => TunedLines,
  signal: SearchSignal,
  replicas: readonly CodeReplica[],
  { lags, highest }: SearchBand,
  plan: SearchPlanInForce,
  onProgress?: (done: number, total: number) => void,
  onRow?: (replica: number, row: number, power: Float64Array, places: Uint32Array) => void,
): HighestCell[] {
  const { dopplersHz, sums } = plan;
  const { places, add } = createProductPower(lags);
  const sharing = rowsWithSameLines(dopplersHz, lineSpacingHz(signal));
  // Few sums are done row by row: `received` still has their lines, and the powers of one row fit into a cache.
  const groups = sums <= SUMS_AT_ONCE ? sharing.flat().map((row) => [row]) : sharing;
  const mostRows = Math.max(...groups.map((rows) => rows.length));
  const atOnce = Math.max(1, Math.min(replicas.length, Math.floor(MOST_POWER_BYTES / (8 * lags * mostRows))));
  const powers = Array.from({ length: mostRows * atOnce }, () => new Float64Array(lags));
  const shifted = Array.from({ length: Math.min(SUMS_AT_ONCE, sums) }, () => new Float64Array(2 * lags));
  const best = replicas.map(({ prn }) => ({ prn, peak: -1, place: 0, row: 0 }));
  const means = replicas.map(() => new Float64Array(dopplersHz.length));

  /** Adds the powers of some sums to the grids of some codes, for rows with the same lines. */
  const addSums = (rows: readonly number[], codes: readonly CodeReplica[], firstSum: number) => {
    const count = Math.min(SUMS_AT_ONCE, sums - firstSum);
    const tuned = rows.map((row) => received(dopplersHz[row]));
    const lines = Array.from({ length: count }, (_, n) => tuned[0].line(firstSum + n));
    rows.forEach((row, place) => {
      const driftChipsPerS = codeDriftChipsPerS(signal, dopplersHz[row]);
      for (let n = 0; n < count; n++) {
        const middleS = plan.startS + (firstSum + n + 0.5) * plan.coherentS;
        shiftLines(shifted[n], lines[n], highest, tuned[place].middle, (driftChipsPerS * middleS) / signal.lengthChips);
      }
      codes.forEach(({ conjugateLines }, n) => {
        const power = powers[place * atOnce + n];
        for (let m = 0; m < count; m++) add(power, shifted[m], conjugateLines);
      });
    });
  };

  let done = 0;
  for (let firstCode = 0; firstCode < replicas.length; firstCode += atOnce) {
    const codes = replicas.slice(firstCode, firstCode + atOnce);
    for (const rows of groups) {
      for (const power of powers) power.fill(0);
      for (let sum = 0; sum < sums; sum += SUMS_AT_ONCE) addSums(rows, codes, sum);
      rows.forEach((row, place) => {
        codes.forEach((_, n) => {
          const power = powers[place * atOnce + n];
          const found = highestAndMean(power);
          means[firstCode + n][row] = found.mean;
          onRow?.(firstCode + n, row, power, places);
          const known = best[firstCode + n];
          if (power[found.place] > known.peak)
            Object.assign(known, { peak: power[found.place], place: found.place, row });
        });
        done += codes.length / replicas.length;
        onProgress?.(done, dopplersHz.length);
      });
    }
  }
  return best.map(({ prn, peak, place, row }, n) => {
    const cellNoise = median(means[n]);
    return {
      prn,
      codePhaseChips: (places[place] * signal.lengthChips) / lags,
      dopplerHz: dopplersHz[row],
      peak: cellNoise > 0 ? peak / cellNoise : 0, // a silent capture has neither noise nor signals
      cellNoise,
    };
  });
}

/** Rows whose Dopplers differ by whole spacings, group by group. */
function rowsWithSameLines(dopplersHz: Float64Array, spacingHz: number): number[][] {
  const groups = new Map<number, number[]>();
  dopplersHz.forEach((dopplerHz, row) => {
    const spacings = dopplerHz / spacingHz;
    const key = Math.round(1e6 * (spacings - Math.floor(spacings))) % 1e6;
    groups.set(key, [...(groups.get(key) ?? []), row]);
  });
  return [...groups.values()];
}

/**
 * Copies the lines -highest to highest around line number `centre` into the order of a transform, line k turned by -k * turns: the code
 * was that much further on than at the first sample.
 */
function shiftLines(out: Float64Array, lines: Float64Array, highest: number, centre: number, turns: number): void {
  const middle = 2 * centre;
  const stepRe = cosTurns(turns);
  const stepIm = -sinTurns(turns);
  let re = 1;
  let im = 0;
  out[0] = lines[middle];
  out[1] = lines[middle + 1];
  for (let k = 1; k <= highest; k++) {
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
    const above = middle + 2 * k;
    const below = middle - 2 * k;
    const to = out.length - 2 * k;
    out[2 * k] = lines[above] * re - lines[above + 1] * im;
    out[2 * k + 1] = lines[above] * im + lines[above + 1] * re;
    out[to] = lines[below] * re + lines[below + 1] * im;
    out[to + 1] = lines[below + 1] * re - lines[below] * im;
  }
}

function highestAndMean(power: Float64Array): { place: number; mean: number } {
  let place = 0;
  let sum = 0;
  for (let n = 0; n < power.length; n++) {
    sum += power[n];
    if (power[n] > power[place]) place = n;
  }
  return { place, mean: sum / power.length };
}

function median(values: Float64Array): number {
  const sorted = Float64Array.from(values).sort();
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
