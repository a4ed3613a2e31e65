import { decibels, PI, pow10Db } from "@/lib/numeric/elementary";
import { SPEED_OF_LIGHT_M_S } from "../constants";

const DEGREES_PER_RAD = 180 / PI;

/**
 * Thermal jitter of a Costas loop's phase in degrees, 1 sigma: (180/pi) sqrt(Bn/(C/N0) (1 + 1/(2 T C/N0))).
 * Kaplan & Hegarty, "Understanding GPS", 2nd edition, 5.6.1; equation number from memory.
 */
export function pllJitterDeg(loopHz: number, cn0DbHz: number, coherentS: number): number {
  const cn0 = pow10Db(cn0DbHz);
  return DEGREES_PER_RAD * Math.sqrt((loopHz / cn0) * (1 + 1 / (2 * coherentS * cn0)));
}

/** A phase in degrees as a length in m along the path of a carrier. */
export const phaseToMetres = (phaseDeg: number, carrierHz: number): number =>
  ((phaseDeg / 360) * SPEED_OF_LIGHT_M_S) / carrierHz;

/**
 * C/N0 in dB-Hz at which the thermal jitter of a Costas loop reaches a limit, the exact solution of `pllJitterDeg`.
 * At 15 degrees, three sigma are the 45 degrees to which its discriminator is straight enough: rule of thumb, Kaplan &
 * Hegarty, 2nd edition, 5.6 (from memory).
 * @param limitDeg 1 sigma, above 0
 */
export function pllThresholdDbHz(loopHz: number, coherentS: number, limitDeg = 15): number {
  const limit = limitDeg / DEGREES_PER_RAD;
  // s^2 c^2 - B c - B/(2T) = 0 in c = C/N0, whose larger root is meant
  const square = limit * limit;
  const root = Math.sqrt(loopHz * loopHz + (2 * square * loopHz) / coherentS);
  return decibels((loopHz + root) / (2 * square));
}

/**
 * Thermal jitter of a frequency loop in Hz, 1 sigma: 1/(2 pi T) sqrt(4 F Bn/(C/N0) (1 + 1/(T C/N0))). Kaplan & Hegarty,
 * 2nd edition, 5.6.2 (from memory). Each pair of correlations is used once; pairs that overlap do far better, for their
 * errors take each other back.
 * @param nearThreshold F is 2 near the threshold and 1 well above it
 */
export function fllJitterHz(loopHz: number, cn0DbHz: number, coherentS: number, nearThreshold: boolean): number {
  const cn0 = pow10Db(cn0DbHz);
  const factor = nearThreshold ? 2 : 1;
  return Math.sqrt(((4 * factor * loopHz) / cn0) * (1 + 1 / (coherentS * cn0))) / (2 * PI * coherentS);
}

/** Largest 1 sigma in Hz of a frequency loop: three of them stay within 1/(4T). Same source, from memory. */
export const fllLimitHz = (coherentS: number): number => 1 / (12 * coherentS);
