import type { SampledCapture } from "./sampledCapture";
import { searchBand } from "./searchBand";
import { searchPlanOf, type SearchRequest } from "./searchPlanOf";
import { searchSatellites, type SatelliteFinding } from "./searchSatellites";
import type { SearchSignal } from "./searchSignal";

/** One satellite's whole grid and what the search found in it. */
export type SearchMap = {
  finding: SatelliteFinding;
  dopplersHz: Float64Array;
  /** Code phases at the first sample. */
  lagsChips: Float64Array;
  /** Row after row, one row a Doppler; mean noise = 1. */
  power: Float32Array;
};

/** `searchSatellites` for one satellite, its grid kept for a picture. Bit edges are not tried: there is one grid. */
export function searchMap(
  capture: SampledCapture,
  signal: SearchSignal,
  prn: number,
  request: Omit<SearchRequest, "bitEdgeStepMs">,
  onProgress?: (done: number, total: number) => void,
): SearchMap {
  const { dopplersHz } = searchPlanOf(capture, signal, request);
  const { lags } = searchBand(capture, signal);
  const power = new Float32Array(dopplersHz.length * lags);
  const [finding] = searchSatellites(capture, signal, [prn], request, onProgress, (_, row, powers, places) => {
    for (let place = 0; place < lags; place++) power[row * lags + places[place]] = powers[place];
  });
  if (finding.cellNoise > 0) for (let n = 0; n < power.length; n++) power[n] /= finding.cellNoise;
  const lagsChips = Float64Array.from({ length: lags }, (_, n) => (n * signal.lengthChips) / lags);
  return { finding, dopplersHz, lagsChips, power };
}
