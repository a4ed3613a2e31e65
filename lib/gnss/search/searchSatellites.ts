import { falseAlarmPerCell } from "../detection";
import { codeReplica } from "./codeReplica";
import { createRefinement, type RefinedSignal } from "./createRefinement";
import { createReceivedLines } from "./createReceivedLines";
import type { SampledCapture } from "./sampledCapture";
import { searchBand } from "./searchBand";
import { searchCells } from "./searchCells";
import { cellThreshold, edgeStartsMs, searchPlanOf, type SearchRequest } from "./searchPlanOf";
import { lineSpacingHz, type SearchSignal } from "./searchSignal";

/** What the search found for one satellite. */
export type SatelliteFinding = {
  prn: number;
  /** Whether the highest cell of its grid passes the threshold. */
  found: boolean;
  /** Power of the highest cell, mean noise = 1. */
  peak: number;
  /** In the unit of `peak`. */
  threshold: number;
  /** Mean noise power of a cell in squared units of the samples. */
  cellNoise: number;
  /** Finer than the grid when found, else the place of the highest cell; its C/N0 is then 0. */
} & RefinedSignal;

/**
 * Parallel code-phase search of a capture: every Doppler row of the window and every code phase for each satellite, coherent
 * sums added as powers, threshold from the false-alarm probability and the noise of the satellite's own grid, and the place
 * of what passes it finer than the grid. Any rate, any intermediate frequency, real or complex samples.
 * It takes the grid as it is: strong satellites and interference raise false peaks, see `searchSky`.
 * @param onProgress called after each Doppler row and each satellite
 * @param onRow given the rows of the grids as they are finished, see `searchCells`; `searchMap` keeps them
 * @returns one finding per entry of `prns`, in that order
 */
export function searchSatellites(
  capture: SampledCapture,
  signal: SearchSignal,
  prns: readonly number[],
  request: SearchRequest,
  onProgress?: (done: number, total: number) => void,
  onRow?: (replica: number, row: number, power: Float64Array, places: Uint32Array) => void,
): SatelliteFinding[] {
  const starts = edgeStartsMs(request);
  const falseAlarmPerSearch = falseAlarmPerCell(request.falseAlarmPerSearch, starts.length);
  let best: SatelliteFinding[] = [];
  starts.forEach((startMs, pass) => {
    const one = { ...request, falseAlarmPerSearch, startMs: (request.startMs ?? 0) + startMs };
    const progress = (done: number, total: number) => onProgress?.(pass * total + done, starts.length * total);
    const findings = searchOnce(capture, signal, prns, one, progress, onRow);
    best = findings.map((finding, n) => (pass === 0 || finding.peak > best[n].peak ? finding : best[n]));
  });
  return best;
}

function searchOnce(
  capture: SampledCapture,
  signal: SearchSignal,
  prns: readonly number[],
  request: SearchRequest,
  onProgress: (done: number, total: number) => void,
  onRow?: (replica: number, row: number, power: Float64Array, places: Uint32Array) => void,
): SatelliteFinding[] {
  const plan = searchPlanOf(capture, signal, request);
  const band = searchBand(capture, signal);
  const replicas = prns.map((prn) => codeReplica(signal, prn, band));
  const total = plan.dopplersHz.length + prns.length;
  const spacingHz = lineSpacingHz(signal);
  const reach = Math.ceil(plan.dopplersHz[0] / -spacingHz);
  const times = { startS: plan.startS, lengthS: plan.coherentS, sums: plan.sums };
  const received = createReceivedLines(capture, spacingHz, band.highest, reach, times);
  const cells = searchCells(received, signal, replicas, band, plan, (done) => onProgress(done, total), onRow);
  const threshold = cellThreshold(plan, band);
  const refine = createRefinement(received, capture, signal, band, plan);
  return cells.map((cell, n) => {
    const found = cell.peak > threshold;
    const place = found
      ? refine(replicas[n], cell)
      : { codePhaseChips: cell.codePhaseChips, dopplerHz: cell.dopplerHz, cn0DbHz: 0 };
    onProgress(plan.dopplersHz.length + n + 1, total);
    return { prn: cell.prn, found, peak: cell.peak, threshold, cellNoise: cell.cellNoise, ...place };
  });
}
