import { robustDeviation } from "@/lib/numeric/statistics";
import type { Echo } from "./echoes";

const TIMES_NOISE = 6;

/** How a trace is read. */
export type EchoReading = {
  /** Time from one point to the next. */
  stepNs: number;
  /** Points averaged on each side of a step, at least 2. */
  window: number;
  /** Points from the middle of an edge until it is over: about its rise time. */
  edge: number;
  /** Share of the sent step below which nothing is said. */
  leastHeight: number;
};

/**
 * Echoes in a reflectometer's trace: places where the mean of the points behind differs most from the mean of those
 * before, above six times what noise alone makes; the height is then read with the edge itself left out. Two echoes
 * closer than edge and window are one.
 * @param trace as of `echoTrace`: share of the sent step, first point at 0 ns
 * @returns earliest first; `ghost` cannot be told from a trace and is false
 */
export function readEchoTrace(trace: ArrayLike<number>, reading: EchoReading): Echo[] {
  const { stepNs, window, edge, leastHeight } = reading;
  if (!(Number.isInteger(window) && window >= 2 && Number.isInteger(edge) && edge >= 0))
    throw new RangeError(`readEchoTrace: whole window from 2 and edge from 0 points, got ${window}, ${edge}`);
  if (!(trace.length >= 2 * (window + edge)))
    throw new RangeError(`readEchoTrace: trace of two windows and edges at least, got ${trace.length} points`);
  const riseAt = createRise(trace, window);
  const limit = Math.max(leastHeight, TIMES_NOISE * noiseOf(trace, window));
  const found: Echo[] = [];
  const rises = Float64Array.from({ length: trace.length + 1 }, (_, n) => riseAt(n, 0));
  for (let n = window; n <= trace.length - window; n++) {
    const height = Math.abs(rises[n]);
    if (height < limit) continue;
    const around = rises.subarray(Math.max(0, n - window - edge), n + window + edge + 1);
    if (around.findIndex((value) => Math.abs(value) >= height) < Math.min(n, window + edge)) continue; // the first of equals counts
    if (around.some((value) => Math.abs(value) > height)) continue;
    const [before, after] = [Math.abs(rises[n - 1]), Math.abs(rises[n + 1] ?? 0)];
    const bend = before - 2 * height + after;
    const shift = bend < 0 ? (before - after) / (2 * bend) : 0;
    found.push({ delayNs: (n - 0.5 + shift) * stepNs, height: riseAt(n, edge), ghost: false });
  }
  return found;
}

/**
 * Mean of `window` points from `gap` beyond n on, less the mean of as many before n; the trace goes on flat beyond its
 * ends.
 */
function createRise(trace: ArrayLike<number>, window: number): (n: number, gap: number) => number {
  const sums = new Float64Array(trace.length + 1);
  for (let n = 0; n < trace.length; n++) sums[n + 1] = sums[n] + trace[n];
  const mean = (from: number) => {
    const start = Math.max(0, Math.min(trace.length - window, from));
    return (sums[start + window] - sums[start]) / window;
  };
  return (n, gap) => mean(n + gap) - mean(n - gap - window);
}

/**
 * Deviation of the difference of two such means when only noise is there, from the differences of neighbouring points.
 */
function noiseOf(trace: ArrayLike<number>, window: number): number {
  const differences = Float64Array.from({ length: trace.length - 1 }, (_, n) => trace[n + 1] - trace[n]);
  return robustDeviation(differences) / Math.sqrt(window);
}
