import { sampleCount, type SampledCapture } from "../search/sampledCapture";
import { lineSpacingHz, type SearchSignal } from "../search/searchSignal";
import { correlate } from "./correlator";
import {
  costasPhaseCycles,
  envelopeDiscriminator,
  frequencyDiscriminatorHz,
  pilotPhaseCycles,
  type Correlation,
} from "./discriminators";
import { findBitEdge } from "./findBitEdge";
import { createLoopFilter, type LoopOrder } from "./loopFilter";
import { createReplicaClock } from "./replicaClock";
import { discriminatorScaleChips, replicaTable } from "./replicaTable";

/** Loops of one part of a run; parts follow each other, wide before narrow. */
export type TrackingStage = {
  /** Length in code periods; the last stage goes on to the end. */
  periods: number;
  /**
   * Code periods in one coherent sum; more than one needs the bit edge, which is then looked for in what went before.
   */
  coherentPeriods: number;
  /** Early to late, above 0 and below 2. */
  spacingChips: number;
  /** Second-order code loop, helped by the carrier. */
  dllHz: number;
  pllOrder: LoopOrder;
  /** 0 for frequency lock alone. */
  pllHz: number;
  /** 0 for phase lock alone. */
  fllHz: number;
};

/**
 * Pull-in by frequency lock, then phase lock at 1 ms, then longer sums: a start for C/A captures of 36 dB-Hz and more.
 */
export const USUAL_STAGES: readonly TrackingStage[] = [
  { periods: 200, coherentPeriods: 1, spacingChips: 1, dllHz: 5, pllOrder: 2, pllHz: 0, fllHz: 15 },
  { periods: 400, coherentPeriods: 1, spacingChips: 0.5, dllHz: 3, pllOrder: 2, pllHz: 15, fllHz: 3 },
  { periods: Infinity, coherentPeriods: 10, spacingChips: 0.5, dllHz: 1, pllOrder: 3, pllHz: 15, fllHz: 0 },
];

/** One coherent sum and what the loops made of it. */
export type TrackingRecord = Correlation & {
  /** Of the first sample, from the start of the capture. */
  startS: number;
  lengthS: number;
  /** Replica when the sum began. */
  codePhaseChips: number;
  carrierCycles: number;
  dopplerHz: number;
  /** Discriminators. */
  codeErrorChips: number;
  phaseErrorCycles: number;
};

export type Tracking = {
  records: TrackingRecord[];
  /** Prompt sum of each code period, real and imaginary parts alternating. */
  prompts: Float64Array;
  /**
   * Code period, counted from the first one summed, at which a data bit begins, below the bit's length; null if not
   * found.
   */
  bitEdge: number | null;
};

/**
 * Follows one satellite through a capture from what a search found: early, prompt and late sums over whole code
 * periods, an envelope code loop of second order helped by the carrier, a Costas loop (a plain one for a pilot) of
 * order 1 to 3 and a frequency loop beside it. Discriminators and filters: Kaplan & Hegarty, "Understanding GPS", 2nd
 * edition, chapter 5.
 * @param start code phase and Doppler at the first sample
 * @param onProgress called after each coherent sum, in samples
 */
export function trackSatellite(
  capture: SampledCapture,
  signal: SearchSignal,
  prn: number,
  start: { codePhaseChips: number; dopplerHz: number },
  stages: readonly TrackingStage[] = USUAL_STAGES,
  onProgress?: (done: number, total: number) => void,
): Tracking {
  const periodsPerBit = signal.symbolS * lineSpacingHz(signal); // Infinity for a pilot
  checkStages(stages, periodsPerBit);
  const hasData = periodsPerBit !== Infinity;
  const total = sampleCount(capture);
  const table = replicaTable(signal, prn, capture.complex ? capture.rateHz / 2 : capture.rateHz / 4);
  const scales = stages.map(({ spacingChips }) => discriminatorScaleChips(table, spacingChips));
  const clock = createReplicaClock(capture, signal, start);
  const [carrier, code] = [createLoopFilter(), createLoopFilter()];
  const records: TrackingRecord[] = [];
  const prompts: number[] = [];
  let bitEdge: number | null = hasData ? null : 0;
  let before: TrackingRecord | null = null;

  const sumPeriods = (periods: number, spacingChips: number): Correlation | null => {
    const sums: Correlation = { earlyI: 0, earlyQ: 0, promptI: 0, promptQ: 0, lateI: 0, lateQ: 0 };
    for (let n = 0; n < periods; n++) {
      const samples = clock.samplesLeft();
      if (clock.sample + samples > total) return null;
      const one = correlate(capture, clock.sample, samples, table, spacingChips, clock.state());
      for (const key of Object.keys(sums) as (keyof Correlation)[]) sums[key] += one[key];
      prompts.push(one.promptI, one.promptQ);
      clock.advance(samples);
    }
    return sums;
  };

  clock.advance(clock.samplesLeft()); // to the first whole code period
  for (;;) {
    const period = prompts.length / 2;
    const at = stageAt(stages, period);
    const { coherentPeriods, spacingChips, dllHz, pllOrder, pllHz, fllHz } = stages[at];
    if (coherentPeriods > 1 && bitEdge === null && period % periodsPerBit === 0)
      bitEdge = recentBitEdge(prompts, periodsPerBit);
    const periods = bitEdge === null ? 1 : coherentPeriods - modulo(period - bitEdge, coherentPeriods);
    const { codePhaseChips, carrierCycles } = clock.state();
    const [startS, { dopplerHz }] = [clock.sample / capture.rateHz, clock];
    const sums = sumPeriods(periods, spacingChips);
    if (!sums) break;
    const lengthS = clock.sample / capture.rateHz - startS;
    const codeErrorChips = envelopeDiscriminator(sums, scales[at]);
    const phaseErrorCycles = hasData ? costasPhaseCycles(sums) : pilotPhaseCycles(sums);
    const record = {
      ...sums,
      startS,
      lengthS,
      codePhaseChips,
      carrierCycles,
      dopplerHz,
      codeErrorChips,
      phaseErrorCycles,
    };
    const frequencyErrorHz: number =
      before === null ? 0 : frequencyDiscriminatorHz(before, sums, (before.lengthS + lengthS) / 2, hasData);
    const loops = { order: pllOrder, phaseHz: pllHz, frequencyHz: fllHz };
    clock.steer(
      start.dopplerHz + carrier.step(loops, phaseErrorCycles, frequencyErrorHz, lengthS),
      code.step({ order: 2, phaseHz: dllHz, frequencyHz: 0 }, codeErrorChips, 0, lengthS),
    );
    records.push(record);
    before = record;
    onProgress?.(clock.sample, total);
  }
  if (hasData) bitEdge ??= recentBitEdge(prompts, periodsPerBit);
  return { records, prompts: Float64Array.from(prompts), bitEdge: hasData ? bitEdge : null };
}

const RECENT_BITS = 100;

function recentBitEdge(prompts: readonly number[], periodsPerBit: number): number | null {
  const first = Math.max(0, prompts.length / 2 - RECENT_BITS * periodsPerBit);
  const found = findBitEdge(prompts.slice(2 * first), periodsPerBit);
  return found && modulo(first + found.edge, periodsPerBit);
}

function stageAt(stages: readonly TrackingStage[], period: number): number {
  let end = 0;
  for (let at = 0; at < stages.length - 1; at++) {
    end += stages[at].periods;
    if (period < end) return at;
  }
  return stages.length - 1;
}

const modulo = (value: number, by: number): number => ((value % by) + by) % by;

function checkStages(stages: readonly TrackingStage[], periodsPerBit: number): void {
  if (stages.length === 0) throw new RangeError("trackSatellite: at least one stage");
  for (const { coherentPeriods, spacingChips } of stages) {
    const divides = periodsPerBit === Infinity || Math.round(periodsPerBit) % coherentPeriods === 0;
    if (!(Number.isInteger(coherentPeriods) && coherentPeriods >= 1 && divides))
      throw new RangeError(`trackSatellite: a part of the bit's ${periodsPerBit} periods, got ${coherentPeriods}`);
    if (!(spacingChips > 0 && spacingChips < 2))
      throw new RangeError(`trackSatellite: spacing above 0 and below 2 chips, got ${spacingChips}`);
  }
}
