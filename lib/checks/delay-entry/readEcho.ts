const LAST_POINTS = 20;

/**
 * Time in ns at which a reflectometer's trace is half-way up to where it ends, between its points by a straight line.
 * @param trace share of the sent step, first point at the sent edge
 */
export function readEcho(trace: readonly number[], stepNs: number): number {
  const end = trace.slice(-LAST_POINTS);
  const half = end.reduce((sum, value) => sum + value, 0) / end.length / 2;
  const above = trace.findIndex((value) => value >= half);
  if (above < 1) throw new RangeError(`readEcho: no edge in ${trace.length} points`);
  const [before, after] = [trace[above - 1], trace[above]];
  return (above - 1 + (half - before) / (after - before)) * stepNs;
}
