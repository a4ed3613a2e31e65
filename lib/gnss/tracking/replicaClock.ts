import type { SampledCapture } from "../search/sampledCapture";
import { codeDriftChipsPerS, type SearchSignal } from "../search/searchSignal";
import type { ReplicaState } from "./correlator";

/** Local code and carrier as they run along a capture. */
export type ReplicaClock = {
  /** At the sample reached. */
  state(): ReplicaState;
  readonly sample: number;
  readonly dopplerHz: number;
  /** Samples until the code period in progress is over. */
  samplesLeft(): number;
  advance(samples: number): void;
  /** Frequencies from here on; the code follows the carrier and goes `codeRate` chips per second faster. */
  steer(dopplerHz: number, codeRate: number): void;
};

const ROUNDING_CHIPS = 1e-6; // a period that ends by less than this has ended

/** @param start code phase and Doppler at the first sample of the capture, where the carrier's phase is 0 */
export function createReplicaClock(
  { rateHz, ifHz }: SampledCapture,
  signal: SearchSignal,
  start: { codePhaseChips: number; dopplerHz: number },
): ReplicaClock {
  let { codePhaseChips, dopplerHz } = start;
  let codeRate = 0;
  let carrierCycles = 0;
  let sample = 0;
  const chipsPerSample = () => (signal.chipRateHz + codeDriftChipsPerS(signal, dopplerHz) + codeRate) / rateHz;
  const cyclesPerSample = () => (ifHz + dopplerHz) / rateHz;
  return {
    state: () => ({
      codePhaseChips,
      chipsPerSample: chipsPerSample(),
      carrierCycles,
      cyclesPerSample: cyclesPerSample(),
    }),
    get sample() {
      return sample;
    },
    get dopplerHz() {
      return dopplerHz;
    },
    samplesLeft: () => Math.ceil((signal.lengthChips - codePhaseChips) / chipsPerSample()),
    advance(samples) {
      codePhaseChips += samples * chipsPerSample();
      if (codePhaseChips >= signal.lengthChips - ROUNDING_CHIPS) codePhaseChips -= signal.lengthChips;
      carrierCycles += samples * cyclesPerSample();
      sample += samples;
    },
    steer(nextDopplerHz, nextCodeRate) {
      dopplerHz = nextDopplerHz;
      codeRate = nextCodeRate;
    },
  };
}
