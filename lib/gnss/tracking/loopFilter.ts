export type LoopOrder = 1 | 2 | 3;

/**
 * Noise bandwidth over natural frequency of the usual loops: Bn = 0.25 w0, 0.53 w0 (a2 = 1.414) and 0.7845 w0 (a3 =
 * 1.1, b3 = 2.4). Kaplan & Hegarty, "Understanding GPS", 2nd edition, table of loop filters (from memory).
 */
export const BANDWIDTH_OVER_NATURAL: Readonly<Record<LoopOrder, number>> = { 1: 0.25, 2: 0.53, 3: 0.7845 };
const A2 = 1.414;
const A3 = 1.1;
const B3 = 2.4;

/** Bandwidths of one step of a filter; 0 leaves the part out. */
export type LoopBandwidths = {
  order: LoopOrder;
  /** One-sided noise bandwidth of the loop on the phase (or code) error. */
  phaseHz: number;
  /** Of the frequency loop that helps it, of one order less. */
  frequencyHz: number;
};

export type LoopFilter = {
  /**
   * Rate to apply until the next step.
   * @param error of phase in cycles, or of code in chips
   * @param frequencyErrorHz 0 where there is none
   * @param stepS time over which the errors were measured
   * @returns change per second, on top of what the loop began with
   */
  step(bandwidths: LoopBandwidths, error: number, frequencyErrorHz: number, stepS: number): number;
};

/**
 * Loop filter of order 1 to 3 with bilinear integrators and a frequency loop of one order less that helps it: Kaplan &
 * Hegarty, "Understanding GPS", 2nd edition, 5.5, figures of the loop filters (from memory). Bandwidths may change from
 * one step to the next; what the integrators hold stays.
 */
export function createLoopFilter(): LoopFilter {
  let acceleration = 0;
  let velocity = 0;
  const step = ({ order, phaseHz, frequencyHz }: LoopBandwidths, error: number, frequencyError: number, s: number) => {
    const w = phaseHz / BANDWIDTH_OVER_NATURAL[order];
    if (order === 1) {
      velocity += s * 4 * frequencyHz * frequencyError;
      return velocity + w * error;
    }
    const helper = frequencyHz / BANDWIDTH_OVER_NATURAL[order === 3 ? 2 : 1];
    let push = w * w * error + helper * frequencyError;
    let direct = A2 * w * error;
    if (order === 3) {
      const accelerationBefore = acceleration;
      acceleration += s * (w * w * w * error + helper * helper * frequencyError);
      push = (acceleration + accelerationBefore) / 2 + A3 * w * w * error + A2 * helper * frequencyError;
      direct = B3 * w * error;
    }
    const velocityBefore = velocity;
    velocity += s * push;
    return (velocity + velocityBefore) / 2 + direct;
  };
  return { step };
}
