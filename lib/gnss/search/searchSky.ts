import { decibels } from "@/lib/numeric/elementary";
import { falseAlarmPerCell, requiredSnr } from "../detection";
import { blankPulses, type MutableCapture } from "./blankPulses";
import { cancelSignal } from "./cancelSignal";
import { exciseNarrowband, type Excision } from "./exciseNarrowband";
import { explainPeak, type PeakExplanation } from "./explainPeak";
import { sampleCount, type SampledCapture } from "./sampledCapture";
import { searchBand } from "./searchBand";
import { edgeStartsMs, searchPlanOf, type SearchRequest } from "./searchPlanOf";
import { searchSatellites, type SatelliteFinding } from "./searchSatellites";
import type { SearchSignal } from "./searchSignal";

/** A peak above the threshold, and what it is. */
export type SkyFinding = {
  prn: number;
  codePhaseChips: number;
  dopplerHz: number;
  cn0DbHz: number;
  peakToThresholdDb: number;
} & ({ verdict: "genuine" } | ({ verdict: "cross-correlation" } & PeakExplanation));

/** The satellites of a capture, and what stood in the way. */
export type SkySearch = {
  /** In the order of the numbers that were asked for; only what passed the threshold. */
  findings: SkyFinding[];
  /** C/N0 that is found nine times in ten, at the mean loss over the grid. */
  sensitivityDbHz: number;
  /** Whether Dopplers of either sign look alike, see `searchBand`. */
  mirrored: boolean;
  /** Satellites whose signals were taken out to see what they cover, strongest first. */
  cancelledPrns: number[];
  excision: Excision;
  /** Share of the time that pulses took. */
  blankedShare: number;
};

/**
 * Largest level that one code may leave in another's grid: -19.4 dB for the worst pair of C/A codes half a kHz apart over
 * 1 ms (computed over all pairs of 1 to 32); 2.4 dB for noise on top of it, 2 dB by which a very strong satellite reads low
 * because its own code raises the noise of its grid, and 1 dB.
 */
const CERTAIN_WITHIN_DB = 14;
const GRID_LOSS_DB = 1.5; // mean over code phases within half a step and Dopplers within half a row: computed
const MOST_PASSES = 6;
const MARGIN_DB = 3;
const UNCHANGED_DB = 3;

/**
 * Search that neither interference nor a strong satellite may fill with satellites that are not there.
 * 1. Pulses are blanked and narrow-band interference is excised.
 * 2. All satellites are searched. What is within 14 dB of the strongest cannot be the shadow of its code, whatever the
 *    codes; it is genuine.
 * 3. If more was found, the genuine ones that are strong enough to account for it are rebuilt from their codes and taken out
 *    of the samples, strongest first, and the rest is searched again, until nothing is found or nothing new is certain.
 * What was found at first and is gone with the strong signals is their cross-correlation; the codes say whose.
 * @param prns satellites that are asked for
 * @param parents further satellites that may be in view
 */
export function searchSky(
  capture: SampledCapture,
  signal: SearchSignal,
  prns: readonly number[],
  parents: readonly number[],
  request: SearchRequest,
  onProgress?: (done: number, total: number) => void,
): SkySearch {
  const plan = searchPlanOf(capture, signal, request);
  const lastStartS = Math.max(...edgeStartsMs(request)) / 1000;
  const clean = stretchOf(capture, plan.startS + lastStartS + plan.sums * plan.coherentS);
  const blankedShare = blankPulses(clean);
  const excision = exciseNarrowband(clean);
  const everybody = [...new Set([...prns, ...parents])];

  const genuine = new Map<number, SatelliteFinding>();
  const cancelled: number[] = [];
  const first = new Map<number, SatelliteFinding>();
  for (let pass = 0; pass < MOST_PASSES; pass++) {
    const findings = searchSatellites(clean, signal, everybody, request, pass === 0 ? onProgress : undefined);
    const found = findings.filter((finding) => finding.found).sort((a, b) => b.cn0DbHz - a.cn0DbHz);
    if (pass === 0) for (const finding of found) first.set(finding.prn, finding);
    else settleNoise(genuine, cancelled, findings);
    const strongestDbHz = found[0]?.cn0DbHz ?? 0; // what is left of a cancelled satellite counts as well
    const uncertain: SatelliteFinding[] = [];
    for (const finding of found) {
      if (cancelled.includes(finding.prn)) continue;
      const certain = finding.cn0DbHz > strongestDbHz - CERTAIN_WITHIN_DB && !isShadow(finding, first.get(finding.prn));
      if (certain || genuine.has(finding.prn)) genuine.set(finding.prn, finding);
      else uncertain.push(finding);
    }
    if (uncertain.length === 0) break;
    const weakestDbHz = uncertain[uncertain.length - 1].cn0DbHz;
    const inTheWay = [...genuine.values()]
      .filter(({ prn, cn0DbHz }) => !cancelled.includes(prn) && cn0DbHz > weakestDbHz + CERTAIN_WITHIN_DB - MARGIN_DB)
      .sort((a, b) => b.cn0DbHz - a.cn0DbHz);
    if (inTheWay.length === 0) break;
    for (const { prn, codePhaseChips, dopplerHz } of inTheWay) {
      cancelSignal(clean, signal, prn, { codePhaseChips, dopplerHz });
      cancelled.push(prn);
    }
  }
  return {
    findings: verdicts(signal, prns, [...genuine.values()], first, plan.coherentS),
    sensitivityDbHz: sensitivityDbHz(clean, signal, request),
    mirrored: searchBand(clean, signal).mirrored,
    cancelledPrns: cancelled,
    excision,
    blankedShare,
  };
}

/**
 * The code of a very strong satellite counts as noise in every grid, its own included, and makes it read low. Once it is
 * taken out the true floor shows; what was read against the higher one is corrected.
 */
function settleNoise(
  genuine: Map<number, SatelliteFinding>,
  cancelled: readonly number[],
  findings: readonly SatelliteFinding[],
): void {
  for (const now of findings) {
    const before = genuine.get(now.prn);
    if (!before || !cancelled.includes(now.prn) || !(now.cellNoise > 0 && now.cellNoise < before.cellNoise)) continue;
    const cn0DbHz = before.cn0DbHz + decibels(before.cellNoise / now.cellNoise);
    genuine.set(now.prn, { ...before, cellNoise: now.cellNoise, cn0DbHz });
  }
}

/** The part of a capture that the plan uses, as samples that may be changed. */
function stretchOf(capture: SampledCapture, untilS: number): MutableCapture {
  const count = Math.min(sampleCount(capture), Math.ceil(untilS * capture.rateHz) + 1);
  const samples = Float32Array.from(capture.samples.subarray(0, (capture.complex ? 2 : 1) * count));
  return { ...capture, samples };
}

/** Whether a peak is what cancelling has left of one that was higher: a signal of its own would have stayed as it was. */
function isShadow(now: SatelliteFinding, before: SatelliteFinding | undefined): boolean {
  if (!before) return false;
  const samePlace =
    Math.abs(now.codePhaseChips - before.codePhaseChips) < 1 && Math.abs(now.dopplerHz - before.dopplerHz) < 500;
  return samePlace && now.cn0DbHz < before.cn0DbHz - UNCHANGED_DB;
}

function verdicts(
  signal: SearchSignal,
  prns: readonly number[],
  genuine: readonly SatelliteFinding[],
  first: ReadonlyMap<number, SatelliteFinding>,
  coherentS: number,
): SkyFinding[] {
  return prns.flatMap((prn): SkyFinding[] => {
    const real = genuine.find((one) => one.prn === prn);
    const finding = real ?? first.get(prn);
    if (!finding) return [];
    const { codePhaseChips, dopplerHz, cn0DbHz } = finding;
    const place = {
      prn,
      codePhaseChips,
      dopplerHz,
      cn0DbHz,
      peakToThresholdDb: decibels(finding.peak / finding.threshold),
    };
    if (real) return [{ ...place, verdict: "genuine" }];
    const explanation = explainPeak(signal, genuine, finding, coherentS);
    return explanation ? [{ ...place, verdict: "cross-correlation", ...explanation }] : [];
  });
}

function sensitivityDbHz(capture: SampledCapture, signal: SearchSignal, request: SearchRequest): number {
  const plan = searchPlanOf(capture, signal, request);
  const { lags, mirrored } = searchBand(capture, signal);
  const perCell = falseAlarmPerCell(plan.falseAlarmPerSearch, plan.dopplersHz.length * lags);
  // Half the degrees are those of half as many sums; the mean over all of them is what they share.
  const rho = requiredSnr(mirrored ? Math.ceil(plan.sums / 2) : plan.sums, perCell, 0.9);
  return decibels(rho / plan.coherentS) + GRID_LOSS_DB;
}
