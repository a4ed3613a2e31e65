import { sin, PI } from "@/lib/numeric/elementary";
import { SPEED_OF_LIGHT_M_S } from "../constants";
import type { PositionError } from "./heldPosition";

/**
 * Time error in ns of a receiver that holds a wrong position, its satellites spread evenly over the sky between two
 * elevations: mean, and standard deviation over the satellites. With s the sine of the elevation, even between its ends:
 *   mean = U (s1 + s2)/2,  variance = (E^2 + N^2)/2 (1 - (s1^2 + s1 s2 + s2^2)/3) + U^2 (s2 - s1)^2/12, both over c
 * Integrals over the solid angle of what `heldPositionTimeError` sums.
 * @param lowestDeg 0 up to `highestDeg`, which is at most 90
 */
export function evenSkyBand(
  { eastM, northM, upM }: PositionError,
  lowestDeg: number,
  highestDeg: number,
): { meanNs: number; spreadNs: number } {
  if (!(lowestDeg >= 0 && lowestDeg <= highestDeg && highestDeg <= 90))
    throw new RangeError(`evenSkyBand: elevations from 0 to 90 degrees, lowest first, got ${lowestDeg}, ${highestDeg}`);
  const low = sin((lowestDeg * PI) / 180);
  const high = sin((highestDeg * PI) / 180);
  const sidewaysM2 = (eastM * eastM + northM * northM) / 2;
  const upM2 = upM * upM;
  const variance =
    sidewaysM2 * (1 - (low * low + low * high + high * high) / 3) + (upM2 * (high - low) * (high - low)) / 12;
  const nsPerM = 1e9 / SPEED_OF_LIGHT_M_S;
  return { meanNs: ((upM * (low + high)) / 2) * nsPerM, spreadNs: Math.sqrt(Math.max(0, variance)) * nsPerM };
}
