import { sinTurns } from "@/lib/numeric/elementary";

/** A piece of the horizon: between two azimuths, clockwise from north, nothing is seen below `topDeg`. */
export type HorizonSector = { fromDeg: number; toDeg: number; topDeg: number };

/**
 * Share of the sky above the mask that an even horizon hides, 0 to 1: (sin top - sin mask)/(1 - sin mask), since a
 * zone's area goes with its height (Archimedes, On the Sphere and Cylinder, book I).
 * @param topDeg elevation up to which the view is blocked, 0 to 90
 * @param maskDeg elevation below which nothing counts, 0 to below 90
 */
export function zoneShare(topDeg: number, maskDeg: number): number {
  const lowest = sinTurns(maskDeg / 360);
  return Math.max(0, (sinTurns(topDeg / 360) - lowest) / (1 - lowest));
}

/**
 * Share of the whole sky above the mask, 0 to 1, that a horizon hides between two azimuths; exact for even pieces.
 * @param horizon pieces that do not overlap, none across north
 * @param maskDeg elevation below which nothing counts
 * @param between the azimuths in deg, 0 to 360, the first below the second; all round unless given
 * @param zone share of a piece's own sky that is hidden; another one than the solid angle's only to compare with it
 * @throws RangeError for a piece that is turned round or out of range
 */
export function blockedShare(
  horizon: readonly HorizonSector[],
  maskDeg: number,
  between: readonly [number, number] = [0, 360],
  zone: (topDeg: number, maskDeg: number) => number = zoneShare,
): number {
  let share = 0;
  for (const { fromDeg, toDeg, topDeg } of horizon) {
    if (!(fromDeg >= 0 && fromDeg < toDeg && toDeg <= 360 && topDeg >= 0 && topDeg <= 90))
      throw new RangeError(`blockedShare: piece from 0 to 360 deg up to 90, got ${fromDeg}, ${toDeg}, ${topDeg}`);
    const widthDeg = Math.min(toDeg, between[1]) - Math.max(fromDeg, between[0]);
    if (widthDeg > 0) share += (widthDeg / 360) * zone(topDeg, maskDeg);
  }
  return share;
}
