import { chiSquareInverseSurvival } from "@/lib/numeric/chiSquare";
import { decibels } from "@/lib/numeric/elementary";
import { falseAlarmPerCell } from "./detection";
import { samplesPerCodePeriod } from "./doppler";
import { refinePeak } from "./refinePeak";
import { codeReplica, searchRow } from "./searchRow";
import {
  checkSearch,
  SEARCH_LAGS,
  searchDopplersHz,
  searchLagsChips,
  type Capture,
  type SearchSettings,
} from "./searchSettings";
import { createSignalSpectra } from "./signalSpectra";

export type { Capture, SearchSettings } from "./searchSettings";
export type SearchPlanSettings = SearchSettings;

/** What the search found for one satellite. */
export type SatelliteSearch = {
  prn: number;
  /** Whether the highest cell passes the threshold. */
  found: boolean;
  /** Code phase at the first sample; finer than the grid when found, else that of the highest cell. */
  codePhaseChips: number;
  dopplerHz: number;
  /** Free of search losses when found; else read from the highest cell as it stands. */
  cn0DbHz: number;
  /** Power of the highest cell, mean noise = 1. */
  peak: number;
  /** In the unit of `peak`. */
  threshold: number;
  /** Mean of I^2 + Q^2 of the noise per sample, in counts^2, as the grid shows it. */
  noise: number;
};

/**
 * Parallel code-phase search of a capture for several satellites: every Doppler bin of the window, 2048 code phases,
 * coherent sums added as powers. Carrier removal and spectra of the samples are shared by all codes.
 * The threshold holds `falseAlarmPerSearch` over all cells of one satellite's grid, taken as independent: chi-square with
 * 2 * sums degrees. The noise is the median over the Doppler rows of their mean power, which a signal in a few rows does
 * not move.
 * The codes of other satellites are not noise: one at 42 dB-Hz leaves peaks of 21 dB-Hz in the grids of all others, and in
 * a full sky a threshold for 1e-3 meets one now and then. A search that may not invent a satellite sets 1e-6, which costs
 * 1 dB at 4 ms x 20, and compares what it finds with `falsePeaks` when a satellite above 45 dB-Hz is in view.
 * @param onProgress called after each Doppler row and each refined satellite
 * @returns one result per entry of `prns`, in that order
 */
export function acquire(
  capture: Capture,
  plan: SearchPlanSettings & { prns: readonly number[] },
  onProgress?: (done: number, total: number) => void,
): SatelliteSearch[] {
  checkSearch(capture, plan);
  const dopplersHz = searchDopplersHz(plan);
  const total = dopplersHz.length + plan.prns.length;
  const spectra = createSignalSpectra(capture, plan);
  const searches = plan.prns.map((prn) => ({ prn, replica: codeReplica(prn), peak: -1, row: 0, lag: 0 }));
  const means = searches.map(() => new Float64Array(dopplersHz.length));
  const power = new Float64Array(SEARCH_LAGS);
  dopplersHz.forEach((dopplerHz, row) => {
    const loaded = spectra.load(dopplerHz);
    searches.forEach((search, n) => {
      searchRow(power, loaded, search.replica);
      means[n][row] = mean(power);
      const lag = highest(power);
      if (power[lag] > search.peak) Object.assign(search, { peak: power[lag], row, lag });
    });
    onProgress?.(row + 1, total);
  });
  const threshold = thresholdOf(plan, dopplersHz.length);
  return searches.map(({ prn, replica, peak, row, lag }, n) => {
    const cellNoise = median(means[n]);
    const coarse = { codePhaseChips: searchLagsChips()[lag], dopplerHz: dopplersHz[row] };
    const noise = noisePerSample(cellNoise, capture, plan, replica.power);
    const level = cellNoise > 0 ? peak / cellNoise : 0; // a silent capture has neither noise nor signals
    const found = level > threshold;
    const asItStands = decibels((Math.max(1e-3, level - 1) * 1000) / plan.coherentMs);
    const estimate = found
      ? refinePeak(capture, prn, coarse, plan.dopplerStepHz, noise)
      : { ...coarse, cn0DbHz: asItStands };
    onProgress?.(dopplersHz.length + n + 1, total);
    return { prn, found, ...estimate, peak: level, threshold, noise };
  });
}

/**
 * The whole grid of one satellite, for a picture.
 * @returns power row by row (one row per Doppler, 2048 lags each), mean noise = 1; threshold in the same unit
 */
export function searchGrid(
  capture: Capture,
  prn: number,
  settings: SearchSettings,
): { dopplersHz: Float64Array; lagsChips: Float64Array; power: Float32Array; threshold: number } {
  checkSearch(capture, settings);
  const dopplersHz = searchDopplersHz(settings);
  const spectra = createSignalSpectra(capture, settings);
  const replica = codeReplica(prn);
  const row = new Float64Array(SEARCH_LAGS);
  const power = new Float32Array(dopplersHz.length * SEARCH_LAGS);
  const means = dopplersHz.map((dopplerHz, n) => {
    searchRow(row, spectra.load(dopplerHz), replica);
    power.set(row, n * SEARCH_LAGS);
    return mean(row);
  });
  const noise = median(means);
  if (noise > 0) for (let n = 0; n < power.length; n++) power[n] /= noise;
  return { dopplersHz, lagsChips: searchLagsChips(), power, threshold: thresholdOf(settings, dopplersHz.length) };
}

function thresholdOf({ sums, falseAlarmPerSearch }: SearchSettings, rows: number): number {
  const perCell = falseAlarmPerCell(falseAlarmPerSearch, rows * SEARCH_LAGS);
  return chiSquareInverseSurvival(perCell, 2 * sums) / (2 * sums);
}

/** A cell sums `sums` powers of coherent sums over n samples, each sample weighted by the replica of the given power. */
function noisePerSample(cell: number, { rateHz }: Capture, plan: SearchSettings, replicaPower: number): number {
  return cell / (plan.sums * plan.coherentMs * samplesPerCodePeriod(rateHz) * replicaPower);
}

function mean(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value;
  return sum / values.length;
}

function highest(values: Float64Array): number {
  let at = 0;
  for (let n = 1; n < values.length; n++) if (values[n] > values[at]) at = n;
  return at;
}

function median(values: Float64Array): number {
  const sorted = Float64Array.from(values).sort();
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}
