import { exp, log } from "./elementary";
import { logGamma, upperGammaRatio } from "./gammaFunction";

const HALVINGS = 200;

/**
 * Probability that a chi-square variable exceeds x: Abramowitz & Stegun 26.4.19.
 * @param x from 0
 * @param degrees of freedom, above 0, whole or not
 */
export function chiSquareSurvival(x: number, degrees: number): number {
  return upperGammaRatio(degrees / 2, x / 2);
}

/**
 * The x that a chi-square variable exceeds with probability p, to 1e-12 relative: the bracket is doubled, then narrowed
 * by false position on ln p (nearly straight in the tail) with halving as a guard.
 * @param p above 0, below 1
 */
export function chiSquareInverseSurvival(p: number, degrees: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`chiSquareInverseSurvival: p between 0 and 1, got ${p}`);
  const excess = (x: number) => log(chiSquareSurvival(x, degrees)) - log(p);
  let low = 0;
  let high = degrees;
  while (excess(high) > 0) {
    low = high;
    high *= 2;
  }
  return root(excess, low, high);
}

/**
 * Probability that a noncentral chi-square variable exceeds x: the central ones weighted by Poisson probabilities,
 * Abramowitz & Stegun 26.4.25. All terms are positive and taken upwards, so nothing cancels. Relative error within 1e-10
 * for lambda up to 1e5.
 * @param lambda noncentrality, sum of the squared means, from 0
 */
export function noncentralChiSquareSurvival(x: number, degrees: number, lambda: number): number {
  if (!(lambda >= 0 && lambda < Infinity))
    throw new RangeError(`noncentralChiSquareSurvival: lambda from 0, got ${lambda}`);
  if (lambda < 1e-300) return chiSquareSurvival(x, degrees); // half of the smallest double is 0, whose logarithm fails
  if (x <= 0) return 1;
  const mean = lambda / 2;
  const half = x / 2;
  const first = Math.max(0, Math.floor(mean - 9 * Math.sqrt(mean) - 20)); // weights below e^-40 are left out
  let a = degrees / 2 + first;
  let weight = exp(first * log(mean) - mean - logGamma(first + 1));
  let survival = upperGammaRatio(a, half);
  let step = exp(a * log(half) - half - logGamma(a + 1)); // Q(a + 1) - Q(a), Abramowitz & Stegun 6.5.21
  let sum = 0;
  for (let n = first; ; n++) {
    const term = weight * survival;
    sum += term;
    if (n > mean && !(term > sum * 1e-17)) return Math.min(1, sum);
    survival = Math.min(1, survival + step);
    a += 1;
    step *= half / a;
    weight *= mean / (n + 1);
  }
}

/** Root of a falling function between low (above 0) and high (at or below 0). */
function root(of: (x: number) => number, low: number, high: number): number {
  for (let n = 0; n < HALVINGS && high - low > 1e-13 * high; n++) {
    const middle = (low + high) / 2;
    if (of(middle) > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
