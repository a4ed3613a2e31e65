import { cos, PI, sin } from "@/lib/numeric/elementary";
import { SPEED_OF_LIGHT_M_S } from "../constants";

/** Position held by a timing receiver minus the true one, in m. */
export type PositionError = { eastM: number; northM: number; upM: number };

/** Where a satellite stands. */
export type Direction = { azimuthDeg: number; elevationDeg: number };

/** Time error in ns that one satellite shows: the error's part along the line of sight, over c. */
function alongSightNs({ eastM, northM, upM }: PositionError, { azimuthDeg, elevationDeg }: Direction): number {
  const azimuth = (azimuthDeg * PI) / 180;
  const elevation = (elevationDeg * PI) / 180;
  const horizontalM = eastM * sin(azimuth) + northM * cos(azimuth);
  return ((horizontalM * cos(elevation) + upM * sin(elevation)) / SPEED_OF_LIGHT_M_S) * 1e9;
}

/**
 * Time error of a receiver that holds a wrong position and takes the mean over its satellites: least squares with the
 * clock as the only unknown, all satellites alike. Geometry; textbook.
 * @returns mean: how late the pulse comes, below 0 for early; spread: standard deviation over the satellites, the size
 *   of the steps as satellites rise and set
 */
export function heldPositionTimeError(
  error: PositionError,
  satellites: readonly Direction[],
): { meanNs: number; spreadNs: number } {
  if (satellites.length === 0) throw new RangeError("heldPositionTimeError: at least one satellite");
  const each = satellites.map((satellite) => alongSightNs(error, satellite));
  const meanNs = each.reduce((sum, value) => sum + value, 0) / each.length;
  const squares = each.reduce((sum, value) => sum + (value - meanNs) * (value - meanNs), 0);
  return { meanNs, spreadNs: Math.sqrt(squares / each.length) };
}

/**
 * The same for satellites spread evenly over the sky above a mask, without gaps: the horizontal error averages out, and
 * of the height error (1 + sin mask)/2 stays. Integral over the solid angle.
 */
export const evenSkyTimeErrorNs = (upM: number, maskDeg: number): number =>
  ((upM * (1 + sin((maskDeg * PI) / 180))) / 2 / SPEED_OF_LIGHT_M_S) * 1e9;

/** Largest time error in ns that a position error can show on any one satellite: its length over c. */
export const largestTimeErrorNs = ({ eastM, northM, upM }: PositionError): number =>
  (Math.sqrt(eastM * eastM + northM * northM + upM * upM) / SPEED_OF_LIGHT_M_S) * 1e9;
