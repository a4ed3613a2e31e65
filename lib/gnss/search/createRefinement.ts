import { atan2, cosTurns, decibels, PI, sinTurns } from "@/lib/numeric/elementary";
import type { CodeReplica } from "./codeReplica";
import { createReceivedLines, type TunedLines } from "./createReceivedLines";
import type { SampledCapture } from "./sampledCapture";
import type { SearchBand } from "./searchBand";
import type { HighestCell } from "./searchCells";
import type { SearchPlanInForce } from "./searchPlanOf";
import { codeDriftChipsPerS, lineSpacingHz, type SearchSignal } from "./searchSignal";

/** A signal's place finer than the grid; code phase at the first sample of the capture. */
export type RefinedSignal = { codePhaseChips: number; dopplerHz: number; cn0DbHz: number };

const PART_S = 0.001; // the sums are taken apart into milliseconds, which serves any coherent time
const TAPS = [-0.5, -0.375, -0.25, -0.125, 0, 0.125, 0.25, 0.375, 0.5]; // of a half chip's main peak, in pulse halves
const LONG_SYMBOL_S = 0.02;
const FINE_DOPPLERS = 40; // steps on either side

/**
 * Code phase, Doppler and C/N0 of a signal from its cell in the grid, by correlations over single milliseconds at nine code
 * phases. Code phase: parabola through the largest mean power and its neighbours. Doppler: the largest sum of powers over
 * blocks within one data symbol, the phase turning from millisecond to millisecond; where symbols are too short for that,
 * the mean turn of the squared values. C/N0: mean power less the noise, freed of the loss by the row's distance and of the
 * share of the code outside the band of the search.
 * @param received lines of the plan's sums
 */
export function createRefinement(
  received: (dopplerHz: number) => TunedLines,
  capture: SampledCapture,
  signal: SearchSignal,
  band: SearchBand,
  plan: SearchPlanInForce,
): (replica: CodeReplica, cell: HighestCell) => RefinedSignal {
  const parts = Math.round((plan.sums * plan.coherentS) / PART_S);
  const spacingChips = 1 / signal.halvesPerChip;
  const correlate = createPartCorrelator(received, capture, signal, band, plan, spacingChips);
  return (replica, cell) => {
    const values = correlate(replica, cell);
    const powers = values.map((series) => meanPower(series));
    const top = powers.indexOf(Math.max(...powers));
    const inside = top > 0 && top < TAPS.length - 1;
    const shift = inside ? vertex(powers[top - 1], powers[top], powers[top + 1]) : 0;
    const tap = TAPS[top] + shift * (TAPS[1] - TAPS[0]);
    const offsetHz = fineDoppler(values[top], plan.dopplerStepHz, signal.symbolS);
    const peakPower = inside ? vertexHeight(powers[top - 1], powers[top], powers[top + 1]) : powers[top];
    const snr = peakPower / (cell.cellNoise / parts) - 1;
    const chips = cell.codePhaseChips + tap * spacingChips;
    return {
      codePhaseChips: chips - signal.lengthChips * Math.floor(chips / signal.lengthChips),
      dopplerHz: cell.dopplerHz + offsetHz,
      cn0DbHz: decibels(Math.max(1e-3, snr) / PART_S / sincSquared(offsetHz * PART_S) / replica.power),
    };
  };
}

/**
 * Correlation over each millisecond of the plan's time, one list of complex values per tap. Where every code period may have
 * another sign, the milliseconds begin with a period.
 */
function createPartCorrelator(
  received: (dopplerHz: number) => TunedLines,
  capture: SampledCapture,
  signal: SearchSignal,
  { highest, lags }: SearchBand,
  plan: SearchPlanInForce,
  spacingChips: number,
) {
  const spacingHz = lineSpacingHz(signal);
  const all = Math.round((plan.sums * plan.coherentS) / PART_S);
  const linesFrom = (startS: number, parts: number) =>
    createReceivedLines(capture, spacingHz, highest, 0, { startS, lengthS: PART_S, sums: parts });
  const aligned = signal.symbolS < LONG_SYMBOL_S;
  // A grid of single milliseconds has the very lines already.
  const own = plan.coherentS === PART_S ? received : linesFrom(plan.startS, all);
  const product = new Float64Array(2 * (2 * highest + 1));
  const tapTurns = TAPS.map((tap) => turnTable((tap * spacingChips) / signal.lengthChips, highest));
  return (replica: CodeReplica, cell: HighestCell): Float64Array[] => {
    const chipsAtStart = cell.codePhaseChips + signal.chipRateHz * plan.startS;
    const untilPeriodS = (1 - ((chipsAtStart / signal.lengthChips) % 1)) / spacingHz;
    const startS = plan.startS + (aligned ? untilPeriodS % PART_S : 0);
    const parts = startS > plan.startS ? all - 1 : all;
    const { middle, line } = (aligned ? linesFrom(startS, parts) : own)(cell.dopplerHz);
    const driftChipsPerS = codeDriftChipsPerS(signal, cell.dopplerHz);
    const values = TAPS.map(() => new Float64Array(2 * parts));
    for (let part = 0; part < parts; part++) {
      const chips = cell.codePhaseChips + driftChipsPerS * (startS + (part + 0.5) * PART_S);
      const lines = line(part).subarray(2 * (middle - highest));
      multiplyTurned(product, lines, replica.conjugateLines, highest, lags, chips / signal.lengthChips);
      tapTurns.forEach((table, tap) => sumTurned(values[tap], 2 * part, product, table));
    }
    return values;
  };
}

/** exp(-2 pi i k turns), k from -highest to highest. */
function turnTable(turns: number, highest: number): Float64Array {
  const table = new Float64Array(2 * (2 * highest + 1));
  for (let k = 0; k <= highest; k++) {
    const c = cosTurns(k * turns);
    const s = sinTurns(k * turns);
    table.set([c, -s], 2 * (highest + k));
    table.set([c, s], 2 * (highest - k));
  }
  return table;
}

function multiplyTurned(
  out: Float64Array,
  lines: Float64Array,
  conjugates: Float64Array,
  highest: number,
  lags: number,
  turns: number,
): void {
  const stepRe = cosTurns(turns);
  const stepIm = -sinTurns(turns);
  let re = cosTurns(highest * turns);
  let im = sinTurns(highest * turns);
  for (let k = -highest; k <= highest; k++) {
    const at = 2 * (k + highest);
    const from = 2 * (k < 0 ? k + lags : k);
    const c = conjugates[from] * re - conjugates[from + 1] * im;
    const s = conjugates[from] * im + conjugates[from + 1] * re;
    out[at] = lines[at] * c - lines[at + 1] * s;
    out[at + 1] = lines[at] * s + lines[at + 1] * c;
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
  }
}

function sumTurned(out: Float64Array, at: number, product: Float64Array, table: Float64Array): void {
  let re = 0;
  let im = 0;
  for (let n = 0; n < product.length; n += 2) {
    re += product[n] * table[n] - product[n + 1] * table[n + 1];
    im += product[n] * table[n + 1] + product[n + 1] * table[n];
  }
  out[at] = re;
  out[at + 1] = im;
}

function meanPower(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return (2 * sum) / values.length;
}

/** Offset in Hz from the row, within a little more than half its distance to the next. */
function fineDoppler(values: Float64Array, stepHz: number, symbolS: number): number {
  const count = values.length / 2;
  const block = Math.min(count, symbolS >= LONG_SYMBOL_S ? 4 : symbolS >= 0.004 ? 2 : 1);
  if (block < 2) return turnOfSquares(values) / (2 * PART_S);
  const gridHz = (0.6 * stepHz) / FINE_DOPPLERS;
  const powers = Array.from({ length: 2 * FINE_DOPPLERS + 1 }, (_, n) =>
    blockPower(values, block, (n - FINE_DOPPLERS) * gridHz * PART_S),
  );
  const top = powers.indexOf(Math.max(...powers));
  const inside = top > 0 && top < powers.length - 1;
  const shift = inside ? vertex(powers[top - 1], powers[top], powers[top + 1]) : 0;
  return (top - FINE_DOPPLERS + shift) * gridHz;
}

/** Sum over blocks of |sum|^2 with the phase turning back by `turns` from value to value. */
function blockPower(values: Float64Array, block: number, turns: number): number {
  const back = Float64Array.from({ length: 2 * block }, (_, n) =>
    n % 2 ? -sinTurns(((n - 1) / 2) * turns) : cosTurns((n / 2) * turns),
  );
  let power = 0;
  for (let from = 0; from + back.length <= values.length; from += back.length) {
    let re = 0;
    let im = 0;
    for (let n = 0; n < back.length; n += 2) {
      re += values[from + n] * back[n] - values[from + n + 1] * back[n + 1];
      im += values[from + n] * back[n + 1] + values[from + n + 1] * back[n];
    }
    power += re * re + im * im;
  }
  return power;
}

/** Mean turn between the squares of neighbours, -1/2 to 1/2; signs do not matter to it. */
function turnOfSquares(values: Float64Array): number {
  let re = 0;
  let im = 0;
  for (let n = 2; n < values.length; n += 2) {
    const c = values[n] * values[n - 2] + values[n + 1] * values[n - 1];
    const s = values[n + 1] * values[n - 2] - values[n] * values[n - 1];
    re += c * c - s * s;
    im += 2 * c * s;
  }
  return atan2(im, re) / (2 * PI);
}

/** Place of the vertex of the parabola through three equally spaced values, -1/2 to 1/2 from the middle one. */
function vertex(before: number, middle: number, after: number): number {
  const bend = before - 2 * middle + after;
  return bend < 0 ? Math.max(-0.5, Math.min(0.5, (before - after) / (2 * bend))) : 0;
}

const vertexHeight = (before: number, middle: number, after: number): number =>
  middle - ((before - after) * vertex(before, middle, after)) / 4;

/** Power left of a millisecond whose phase gains `turns`. */
function sincSquared(turns: number): number {
  if (turns === 0) return 1;
  const ratio = sinTurns(turns / 2) / (PI * turns);
  return ratio * ratio;
}
