import { CA_LENGTH_CHIPS, DATA_BIT_MS } from "@/lib/gnss/constants";
import {
  codeLossDb,
  coherentSnr,
  detectionProbability,
  dopplerLossDb,
  falseAlarmPerCell,
  thresholdSigma2,
} from "@/lib/gnss/detection";
import type { SceneSatellite } from "@/lib/gnss/scene";
import { SEARCH_LAGS, searchDopplersHz, type SearchSettings } from "@/lib/gnss/searchSettings";
import { circularDifference } from "../circularDifference";

/** Chance that a search of a capture finds this very signal: its place between the cells and its data bits are known here. */
export function expectedDetection(satellite: SceneSatellite, settings: SearchSettings): number {
  const { coherentMs, sums, dopplerStepHz, falseAlarmPerSearch } = settings;
  const cells = searchDopplersHz(settings).length * SEARCH_LAGS;
  const threshold = thresholdSigma2(falseAlarmPerCell(falseAlarmPerSearch, cells), sums);
  const offBinHz = circularDifference(satellite.dopplerHz, 0, dopplerStepHz);
  const offCellChips = circularDifference(satellite.codePhaseChips, 0, CA_LENGTH_CHIPS / SEARCH_LAGS);
  const lossDb = dopplerLossDb(offBinHz, coherentMs / 1000) + codeLossDb(offCellChips);
  const rho = coherentSnr(satellite.cn0DbHz - lossDb, coherentMs / 1000);
  return detectionProbability(threshold, sums, rho * powerLeftByBits(satellite, coherentMs, sums));
}

/** Mean over the coherent sums of (1 - 2a)^2, a sign change at the fraction a of a sum. */
function powerLeftByBits(satellite: SceneSatellite, coherentMs: number, sums: number): number {
  const { dataBits, bitEdgeMs, codePhaseChips } = satellite;
  if (!dataBits) return 1;
  // The first period began before the first sample, so the edges come earlier by the phase.
  const firstEdgeMs = bitEdgeMs - codePhaseChips / CA_LENGTH_CHIPS;
  let power = sums;
  for (let edge = 0; firstEdgeMs + edge * DATA_BIT_MS < sums * coherentMs; edge++) {
    const place = (firstEdgeMs + edge * DATA_BIT_MS) / coherentMs;
    const before = bitEdgeMs === 0 ? edge - 1 : edge; // bit 0 is in progress at the first sample
    if (
      place <= 0 ||
      dataBits[(before + dataBits.length) % dataBits.length] === dataBits[(before + 1) % dataBits.length]
    )
      continue;
    const fraction = place - Math.floor(place);
    power -= 1 - (1 - 2 * fraction) * (1 - 2 * fraction);
  }
  return power / sums;
}
