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

/**
 * Searches every Doppler row and every code phase for all codes at once. Rows that differ by whole line spacings have the
 * same received lines, only shifted against the code's; they are computed once and serve every satellite.
 * The noise of a grid is the median over its rows of their mean power, which a signal in a few rows does not move.
 * @param received lines of the plan's sums, reaching as far as its Dopplers
 * @param onProgress called after each Doppler row
 * @returns one cell per replica, in that order
 */
export function searchCells(
  received: (dopplerHz: number) => TunedLines,
  signal: SearchSignal,
  replicas: readonly CodeReplica[],
  { lags, highest }: SearchBand,
  plan: SearchPlanInForce,
  onProgress?: (done: number, total: number) => void,
): HighestCell[] {
  const { places, add } = createProductPower(lags);
  const shifted = Array.from({ length: plan.sums }, () => new Float64Array(2 * lags));
  const power = new Float64Array(lags);
  const best = replicas.map(({ prn }) => ({ prn, peak: -1, place: 0, row: 0 }));
  const means = replicas.map(() => new Float64Array(plan.dopplersHz.length));
  rowsByLines(plan.dopplersHz, lineSpacingHz(signal)).forEach((row, done, rows) => {
    const { middle, line } = received(plan.dopplersHz[row]);
    const driftChipsPerS = codeDriftChipsPerS(signal, plan.dopplersHz[row]);
    shifted.forEach((out, sum) => {
      const middleS = plan.startS + (sum + 0.5) * plan.coherentS;
      shiftLines(out, line(sum), highest, middle, (driftChipsPerS * middleS) / signal.lengthChips);
    });
    replicas.forEach((replica, n) => {
      power.fill(0);
      for (const spectrum of shifted) add(power, spectrum, replica.conjugateLines);
      const { place, mean } = highestAndMean(power);
      means[n][row] = mean;
      if (power[place] > best[n].peak) Object.assign(best[n], { peak: power[place], place, row });
    });
    onProgress?.(done + 1, rows.length);
  });
  return best.map(({ prn, peak, place, row }, n) => {
    const cellNoise = median(means[n]);
    return {
      prn,
      codePhaseChips: (places[place] * signal.lengthChips) / lags,
      dopplerHz: plan.dopplersHz[row],
      peak: cellNoise > 0 ? peak / cellNoise : 0, // a silent capture has neither noise nor signals
      cellNoise,
    };
  });
}

/** Row numbers with those next to each other that share their lines. */
function rowsByLines(dopplersHz: Float64Array, spacingHz: number): number[] {
  const place = (row: number) => {
    const spacings = dopplersHz[row] / spacingHz;
    return Math.round(1e6 * (spacings - Math.floor(spacings))) % 1e6;
  };
  return Array.from(dopplersHz, (_, row) => row).sort((a, b) => place(a) - place(b) || a - b);
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
