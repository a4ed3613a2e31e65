/** One point of an MTIE or TDEV curve. */
export type CurvePoint = { tauS: number; ns: number };

/** The point of a curve that comes nearest to its mask, or passes it farthest. */
export type MaskMargin = {
  /** Whether no point passes the mask. */
  within: boolean;
  tauS: number;
  ns: number;
  limitNs: number;
  /** Limit over value less 1; below 0 when the mask is passed. */
  margin: number;
};

/**
 * A curve against its mask, judged by the ratio of the two: masks are drawn on logarithmic scales. A point without a
 * value is left out.
 * @param limitNs such as `mtieLimitNs` of a clock class
 * @returns null when no point has a value
 */
export function maskMargin(curve: readonly CurvePoint[], limitNs: (tauS: number) => number): MaskMargin | null {
  let worst: MaskMargin | null = null;
  for (const { tauS, ns } of curve) {
    if (Number.isNaN(ns)) continue;
    const limit = limitNs(tauS);
    const margin = limit / ns - 1;
    if (worst === null || margin < worst.margin) worst = { within: margin >= 0, tauS, ns, limitNs: limit, margin };
  }
  return worst;
}
