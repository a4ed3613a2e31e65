import { CA_LENGTH_CHIPS, DATA_BIT_MS } from "@/lib/gnss/constants";
import type { SceneSatellite } from "@/lib/gnss/scene";
import { SEARCH_LAGS, type SearchSettings } from "@/lib/gnss/searchSettings";
import { cosTurns, decibels, pow10Db, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import { peakShape } from "./peakShape";

/** The cells of a search grid around one signal, power with mean noise = 1, row by row. */
export type Patch = {
  dopplersHz: number[];
  lagsChips: number[];
  power: Float64Array;
  /** C/N0 from sums of 1 ms at the cell nearest to the signal, free of search losses, as a refined search has it. */
  refinedDbHz: number;
};

export const LAG_STEP_CHIPS = CA_LENGTH_CHIPS / SEARCH_LAGS;
const SIDE = 2; // cells to either side: noise moves a peak no further
const CELLS = 2 * SIDE + 1;
const MIDDLE = 2 * (SIDE * CELLS + SIDE);
const BLOCKS_PER_MS = 2; // noise is white, so blocks are independent; a bit edge is placed to half a millisecond

type Settings = Pick<SearchSettings, "coherentMs" | "sums" | "dopplerStepHz">;

/**
 * Draws what a search of a capture would show around a signal, without the samples: coherent sums of blocks, each with the
 * signal's own phase, data bit and white Gaussian noise, then added as powers. Without a signal such a cell is chi-square of
 * 2 * sums degrees, with one it is noncentral: Kaplan & Hegarty, "Understanding GPS", 2nd edition, 5.8. Neighbouring bins
 * share their noise through the blocks, neighbouring lags by half, as half-chip steps of a chip code do.
 */
export function drawPatch(signal: SceneSatellite, settings: Settings, random: Random): Patch {
  const { coherentMs, sums, dopplerStepHz } = settings;
  const nearestBin = Math.floor(signal.dopplerHz / dopplerStepHz + 0.5);
  const nearestLag = Math.floor(signal.codePhaseChips / LAG_STEP_CHIPS + 0.5);
  const around = Array.from({ length: CELLS }, (_, n) => n - SIDE);
  const dopplersHz = around.map((n) => (nearestBin + n) * dopplerStepHz);
  const lagsChips = around.map((n) => (nearestLag + n) * LAG_STEP_CHIPS);
  const levels = lagsChips.map((lag) => peakShape(lag - signal.codePhaseChips));
  const blocks = coherentMs * BLOCKS_PER_MS;
  const amplitude = Math.sqrt(pow10Db(signal.cn0DbHz) / (1000 * BLOCKS_PER_MS)); // noise of a block: 1
  const turns = dopplersHz.map((binHz) => (signal.dopplerHz - binHz) / (1000 * BLOCKS_PER_MS));
  const power = new Float64Array(CELLS * CELLS);
  const cells = new Float64Array(2 * CELLS * CELLS);
  let shortPower = 0;
  for (let sum = 0; sum < sums; sum++) {
    cells.fill(0);
    let [re, im] = [0, 0];
    for (let block = 0; block < blocks; block++) {
      const bit = dataBitAt(signal, (sum * blocks + block + 0.5) / BLOCKS_PER_MS);
      addBlock(cells, block, { amplitude: amplitude * bit, levels, turns }, random);
      if ((block + 1) % BLOCKS_PER_MS !== 0) continue;
      const [addedRe, addedIm] = [cells[MIDDLE] - re, cells[MIDDLE + 1] - im];
      shortPower += (addedRe * addedRe + addedIm * addedIm) / BLOCKS_PER_MS;
      [re, im] = [cells[MIDDLE], cells[MIDDLE + 1]];
    }
    for (let at = 0; at < power.length; at++) {
      power[at] += (cells[2 * at] * cells[2 * at] + cells[2 * at + 1] * cells[2 * at + 1]) / (blocks * sums);
    }
  }
  const excess = Math.max(1e-3, shortPower / (sums * coherentMs) - 1);
  const refinedDbHz = decibels((excess * 1000) / (levels[SIDE] * levels[SIDE]));
  return { dopplersHz, lagsChips, power, refinedDbHz };
}

/** Adds one block to every cell: the carrier turned back by the bin's Doppler, in rows; lags in columns. */
function addBlock(
  cells: Float64Array,
  block: number,
  { amplitude, levels, turns }: { amplitude: number; levels: readonly number[]; turns: readonly number[] },
  random: Random,
): void {
  const noise = lagNoise(random);
  turns.forEach((turnsPerBlock, row) => {
    // The signal is still at its own phase 0 here: the noise of a bin is the same whatever frame it is counted in.
    const re = cosTurns(block * turnsPerBlock);
    const im = sinTurns(block * turnsPerBlock);
    levels.forEach((level, column) => {
      const at = 2 * (row * CELLS + column);
      const [noiseRe, noiseIm] = [noise[2 * column], noise[2 * column + 1]];
      const signal = amplitude * level;
      cells[at] += (signal + noiseRe) * re - noiseIm * im;
      cells[at + 1] += (signal + noiseRe) * im + noiseIm * re;
    });
  });
}

/** Complex noise of power 1 at each lag; half of it is the next lag's too. */
function lagNoise(random: Random): Float64Array {
  const parts = Float64Array.from({ length: 2 * (CELLS + 1) }, () => random.gaussian() / 2);
  return Float64Array.from({ length: 2 * CELLS }, (_, n) => parts[n] + parts[n + 2]);
}

function dataBitAt({ dataBits, bitEdgeMs, codePhaseChips }: SceneSatellite, atMs: number): number {
  if (!dataBits) return 1;
  const period = Math.floor(atMs + codePhaseChips / CA_LENGTH_CHIPS);
  const bit = Math.floor((period + ((DATA_BIT_MS - bitEdgeMs) % DATA_BIT_MS)) / DATA_BIT_MS);
  return dataBits[bit % dataBits.length];
}
