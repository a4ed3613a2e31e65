import { SPEED_OF_LIGHT_M_S } from "../constants";
import { BANDWIDTH_OVER_NATURAL, type LoopOrder } from "./loopFilter";

/**
 * Steady error of a carrier loop in degrees under the motion that its order just follows late: range rate (m/s) at
 * order 1, acceleration (m/s^2) at 2, jerk (m/s^3) at 3: 360/lambda * motion / w0^order with w0 from the noise
 * bandwidth. Kaplan & Hegarty, "Understanding GPS", 2nd edition, 5.6 (from memory).
 */
export function dynamicStressDeg(order: LoopOrder, motion: number, loopHz: number, carrierHz: number): number {
  const natural = loopHz / BANDWIDTH_OVER_NATURAL[order];
  let power = 1;
  for (let n = 0; n < order; n++) power *= natural;
  return (360 * carrierHz * motion) / (SPEED_OF_LIGHT_M_S * power);
}

/** Shares of the phase error of a carrier loop, all in degrees; sigmas 1 sigma. */
export type PhaseErrors = {
  thermalDeg: number;
  vibrationDeg: number;
  oscillatorDeg: number;
  /** Steady, taken in full. */
  stressDeg: number;
};

/** The limit that three sigma of noise and the stress together must keep to. Kaplan & Hegarty 5.6, from memory. */
export const PHASE_LIMIT_DEG = 45;

/**
 * Room in degrees until a Costas loop's error budget is used up: 45 - 3 sqrt(sum of the squared sigmas) - stress. Below
 * 0 the loop is expected to lose lock. Rule of thumb, Kaplan & Hegarty, 2nd edition, 5.6 (from memory).
 */
export function phaseMarginDeg({ thermalDeg, vibrationDeg, oscillatorDeg, stressDeg }: PhaseErrors): number {
  const noise = thermalDeg * thermalDeg + vibrationDeg * vibrationDeg + oscillatorDeg * oscillatorDeg;
  return PHASE_LIMIT_DEG - 3 * Math.sqrt(noise) - Math.abs(stressDeg);
}
