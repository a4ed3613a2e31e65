import { cos, PI, pow10, sin } from "@/lib/numeric/elementary";

const RAD_PER_DEG = PI / 180;

/** Extra path in m of a reflection from level ground below an antenna, 2 h sin(elevation). Geometry; textbook. */
export const groundExtraPathM = (heightM: number, elevationDeg: number): number =>
  2 * heightM * sin(elevationDeg * RAD_PER_DEG);

/**
 * Extra path in m of a reflection from an upright wall, 2 d cos(elevation) cos(azimuth difference): the satellite
 * stands on the antenna's side of the wall. Geometry; textbook.
 * @param azimuthDifferenceDeg between the satellite and the way from the wall to the antenna, at most 90
 */
export const wallExtraPathM = (distanceM: number, elevationDeg: number, azimuthDifferenceDeg: number): number =>
  2 * distanceM * cos(elevationDeg * RAD_PER_DEG) * cos(azimuthDifferenceDeg * RAD_PER_DEG);

/** Amplitude ratio of a level in dB below the direct signal: 10^(dB/20). */
export const amplitudeRatio = (levelDb: number): number => pow10(levelDb / 20);
