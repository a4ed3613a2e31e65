import { CA_LENGTH_CHIPS } from "@/lib/gnss/constants";
import { TRACE_POINTS_PER_CHIP } from "@/lib/gnss/correlatorTrace";
import { envelopeThresholdSigma } from "@/lib/gnss/detection";
import { PI } from "@/lib/numeric/elementary";

export const CELLS_PER_CHIP = TRACE_POINTS_PER_CHIP;
export const STEP_CHIPS = 1 / CELLS_PER_CHIP;
export const CELLS = CA_LENGTH_CHIPS * CELLS_PER_CHIP;

export type TraceReading = {
  highestLagChips: number;
  highest: number;
  secondLagChips: number;
  second: number;
  noiseMean: number;
  noiseMedian: number;
  noiseRms: number;
  threshold: number;
  detected: boolean;
};

/**
 * Reads a correlator trace as the check asks: noise and second peak from the cells more than 1 chip from the highest.
 * @param trace |R| by lag, 8 cells a chip, one whole code
 * @param falseAlarmPerCell probability that one cell of noise alone exceeds the threshold
 */
export function readTrace(trace: readonly number[], falseAlarmPerCell: number): TraceReading {
  const highestCell = highestOf(trace, () => true);
  const away = (cell: number) => cellsApart(cell, highestCell) > CELLS_PER_CHIP;
  const secondCell = highestOf(trace, away);
  const noise = trace.filter((_, cell) => away(cell));
  const noiseMean = noise.reduce((sum, value) => sum + value, 0) / noise.length;
  const threshold = rayleighThreshold(noiseMean, falseAlarmPerCell);
  return {
    highestLagChips: highestCell * STEP_CHIPS,
    highest: trace[highestCell],
    secondLagChips: secondCell * STEP_CHIPS,
    second: trace[secondCell],
    noiseMean,
    noiseMedian: [...noise].sort((a, b) => a - b)[Math.floor(noise.length / 2)],
    noiseRms: Math.sqrt(noise.reduce((sum, value) => sum + value * value, 0) / noise.length),
    threshold,
    detected: trace[highestCell] > threshold,
  };
}

/**
 * Envelope of I and Q noise of standard deviation sigma: mean sigma sqrt(pi/2), exceeded with probability p at
 * sigma sqrt(-2 ln p). Kaplan & Hegarty, Understanding GPS, 2nd ed., 5.8.
 */
export const rayleighThreshold = (noiseMean: number, falseAlarmPerCell: number): number =>
  (noiseMean / Math.sqrt(PI / 2)) * envelopeThresholdSigma(falseAlarmPerCell);

function highestOf(trace: readonly number[], allowed: (cell: number) => boolean): number {
  let highest = -1;
  trace.forEach((value, cell) => {
    if (allowed(cell) && (highest < 0 || value > trace[highest])) highest = cell;
  });
  return highest;
}

function cellsApart(a: number, b: number): number {
  const apart = Math.abs(a - b);
  return Math.min(apart, CELLS - apart);
}
