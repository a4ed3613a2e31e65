import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import type { SampledCapture } from "../search/sampledCapture";
import type { Correlation } from "./discriminators";
import { readReplica, type ReplicaTable } from "./replicaTable";

/** Where replica code and carrier stand at a sample, and how fast they go. */
export type ReplicaState = {
  codePhaseChips: number;
  chipsPerSample: number;
  carrierCycles: number;
  cyclesPerSample: number;
};

/**
 * Sums of a run of samples with an early, a prompt and a late replica of one code, the carrier taken off; the sums grow
 * with the number of samples. Straight lines between the points of the table.
 * @param first sample to begin with
 * @param count of samples, over less than one code period
 * @param state at the first sample; code phase from 0 below the code's length
 */
export function correlate(
  capture: SampledCapture,
  first: number,
  count: number,
  table: ReplicaTable,
  spacingChips: number,
  state: ReplicaState,
): Correlation {
  const { samples, complex } = capture;
  const { pointsPerChip } = table;
  const pointStep = state.chipsPerSample * pointsPerChip;
  const shift = (spacingChips / 2) * pointsPerChip;
  let point = state.codePhaseChips * pointsPerChip;
  let re = cosTurns(state.carrierCycles);
  let im = -sinTurns(state.carrierCycles);
  const stepRe = cosTurns(state.cyclesPerSample);
  const stepIm = -sinTurns(state.cyclesPerSample);
  let [earlyI, earlyQ, promptI, promptQ, lateI, lateQ] = [0, 0, 0, 0, 0, 0];
  for (let n = first; n < first + count; n++) {
    const i = complex ? samples[2 * n] : samples[n];
    const q = complex ? samples[2 * n + 1] : 0;
    const wipedI = i * re - q * im;
    const wipedQ = i * im + q * re;
    const early = readReplica(table, point + shift);
    const prompt = readReplica(table, point);
    const late = readReplica(table, point - shift);
    earlyI += wipedI * early;
    earlyQ += wipedQ * early;
    promptI += wipedI * prompt;
    promptQ += wipedQ * prompt;
    lateI += wipedI * late;
    lateQ += wipedQ * late;
    point += pointStep;
    const next = re * stepRe - im * stepIm;
    im = re * stepIm + im * stepRe;
    re = next;
  }
  return { earlyI, earlyQ, promptI, promptQ, lateI, lateQ };
}
