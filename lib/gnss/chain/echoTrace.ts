import { erfc } from "@/lib/numeric/erfc";
import type { Random } from "@/lib/numeric/random";
import type { Echo } from "./echoes";

const SIGMAS_FROM_10_TO_90 = 2.5631031310892007; // of a normal law's distribution function

/**
 * What a reflectometer shows: the sum of the echoes of one sent step against time, as a share of the step.
 * @param riseNs time from 10 % to 90 % of an edge, Gaussian in shape
 * @param stepNs between points; the first stands at 0 ns, the sent edge's own time
 * @param noise standard deviation of a point as a share of the step, with its draws; null for none
 */
export function echoTrace(
  echoes: readonly Echo[],
  { points, stepNs, riseNs }: { points: number; stepNs: number; riseNs: number },
  noise: { sigma: number; random: Random } | null = null,
): Float64Array {
  if (!(stepNs > 0 && riseNs > 0))
    throw new RangeError(`echoTrace: step and rise above 0 ns, got ${stepNs}, ${riseNs}`);
  const scale = (riseNs / SIGMAS_FROM_10_TO_90) * Math.SQRT2;
  return Float64Array.from({ length: points }, (_, n) => {
    const clean = echoes.reduce((sum, { delayNs, height }) => sum + height * edge((n * stepNs - delayNs) / scale), 0);
    return noise ? clean + noise.sigma * noise.random.gaussian() : clean;
  });
}

/** Rising edge from 0 to 1; flat, and cheap, beyond six widths. */
const edge = (x: number): number => (x < -6 ? 0 : x > 6 ? 1 : erfc(-x) / 2);
