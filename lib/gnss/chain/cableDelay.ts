import { SPEED_OF_LIGHT_M_S } from "../constants";

const LIGHT_M_NS = SPEED_OF_LIGHT_M_S / 1e9;

/**
 * Delay of a cable in ns per m, 1/(VF * 0.299792458); definition of the velocity factor. About 0.66 for solid
 * polyethylene, 0.83 to 0.85 for foam (common practice, no source): take the data sheet.
 */
export function delayNsPerM(velocityFactor: number): number {
  checkVelocityFactor(velocityFactor);
  return 1 / (velocityFactor * LIGHT_M_NS);
}

/** Delay of a run of cable in ns. */
export const cableDelayNs = (lengthM: number, velocityFactor: number): number => lengthM * delayNsPerM(velocityFactor);

/** A distance with its standard uncertainty. */
export type Distance = { distanceM: number; uncertaintyM: number };

/**
 * Distance of a fault from the time its echo takes there and back, d = VF c t/2. The relative uncertainties of velocity
 * factor and time add as squares: JCGM 100, 5.1.6.
 * @param echoNs from the sent edge to the echo, at the reflectometer
 */
export function faultDistance(
  echoNs: number,
  velocityFactor: number,
  uncertainty: { echoNs: number; velocityFactor: number } = { echoNs: 0, velocityFactor: 0 },
): Distance {
  const halfNsPerM = 2 * delayNsPerM(velocityFactor);
  const ofTime = uncertainty.echoNs / halfNsPerM;
  const ofFactor = (echoNs / halfNsPerM / velocityFactor) * uncertainty.velocityFactor;
  return { distanceM: echoNs / halfNsPerM, uncertaintyM: Math.sqrt(ofTime * ofTime + ofFactor * ofFactor) };
}

/** Velocity factor of a cable whose length is known, from the echo of its open end. */
export function velocityFactorOfEcho(lengthM: number, echoNs: number): number {
  const factor = (2 * lengthM) / (echoNs * LIGHT_M_NS);
  checkVelocityFactor(factor);
  return factor;
}

function checkVelocityFactor(velocityFactor: number): void {
  if (!(velocityFactor > 0 && velocityFactor <= 1))
    throw new RangeError(`velocity factor above 0 up to 1, got ${velocityFactor}`);
}
