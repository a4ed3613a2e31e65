import { noncentralChiSquareSurvival } from "@/lib/numeric/chiSquare";

const NODES_PER_WIDTH = 4;
const FAR_WIDTHS = 9; // beyond them the probability is 1 to 1e-17

/**
 * Detection probability of K sums as a function of their ratio rho, for one threshold and many ratios, as when thousands of
 * satellites are drawn. The noncentral chi-square law is evaluated at few nodes, when first needed, with its first two
 * derivatives: dQ(x; n, lambda)/dlambda = (Q(x; n + 2, lambda) - Q(x; n, lambda))/2 follows from Abramowitz & Stegun 26.4.25.
 * Between them stands the polynomial of degree five that has all six values. Within 1e-7 of `detectionProbability`.
 * @param threshold on the sum of K squares, noise power per component = 1
 */
export function createDetectionCurve(threshold: number, sums: number): (rho: number) => number {
  const degrees = 2 * sums;
  // Width of the rise in lambda: standard deviation of the noncentral law whose mean is the threshold.
  const width = Math.sqrt(2 * (degrees + 2 * Math.max(0, threshold - degrees)));
  const step = width / NODES_PER_WIDTH;
  const certain = Math.max(0, threshold - degrees) + FAR_WIDTHS * width;
  const nodes: (Float64Array | undefined)[] = [];
  const nodeAt = (n: number): Float64Array => (nodes[n] ??= derivatives(threshold, degrees, n * step, step));
  return (rho) => {
    const lambda = degrees * rho;
    if (lambda >= certain) return 1;
    const n = Math.floor(lambda / step);
    return hermite(nodeAt(n), nodeAt(n + 1), lambda / step - n);
  };
}

/** Probability and its first two derivatives, per step. */
function derivatives(threshold: number, degrees: number, lambda: number, step: number): Float64Array {
  const [q0, q1, q2] = [0, 2, 4].map((more) => noncentralChiSquareSurvival(threshold, degrees + more, lambda));
  return Float64Array.from([q0, ((q1 - q0) / 2) * step, ((q2 - 2 * q1 + q0) / 4) * step * step]);
}

/** Two-point Hermite interpolation with second derivatives; x from 0 to 1. Textbook. */
function hermite(left: Float64Array, right: Float64Array, x: number): number {
  const [f, d, s] = left;
  const rise = right[0] - f - d - s / 2;
  const slope = right[1] - d - s;
  const bend = right[2] - s;
  const cubic = 10 * rise - 4 * slope + bend / 2;
  const quartic = -15 * rise + 7 * slope - bend;
  const quintic = 6 * rise - 3 * slope + bend / 2;
  return f + x * (d + x * (s / 2 + x * (cubic + x * (quartic + x * quintic))));
}
