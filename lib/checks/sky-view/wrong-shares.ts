/*
 * Shares of a piece's sky that are not solid angles, for the wrong methods and for the reasons in a marking. Both run
 * from 0 at the mask to 1 at the zenith.
 */

/** Area on a polar plot whose radius runs evenly from zenith to horizon. */
export function planeShare(topDeg: number, maskDeg: number): number {
  const shown = (90 - Math.max(topDeg, maskDeg)) / (90 - maskDeg);
  return 1 - shown * shown;
}

/** Degrees of elevation, as on a drawing of azimuth against elevation. */
export const degreesShare = (topDeg: number, maskDeg: number): number => Math.max(0, topDeg - maskDeg) / (90 - maskDeg);
