import { chiSquareInverseSurvival, chiSquareSurvival, noncentralChiSquareSurvival } from "@/lib/numeric/chiSquare";
import { decibels, expm1, log, log1p, PI, pow10Db, sinTurns } from "@/lib/numeric/elementary";
import { erfcInverse } from "@/lib/numeric/erfc";

/*
 * Detection of a code in white noise. sigma^2 is the noise power per component (I or Q) of one coherent sum, rho = C/N0 * T
 * its signal-to-noise ratio. K sums of |r|^2/sigma^2 follow a chi-square law of 2K degrees, noncentral by 2 K rho when the
 * signal is there: Kaplan & Hegarty, "Understanding GPS", 2nd edition, 5.8.
 */

/** Threshold for a single envelope in sigma, sqrt(-2 ln Pfa): Rayleigh law. */
export const envelopeThresholdSigma = (falseAlarm: number): number => Math.sqrt(-2 * log(falseAlarm));

/** Ratio rho of one coherent sum; not in dB. */
export const coherentSnr = (cn0DbHz: number, coherentS: number): number => pow10Db(cn0DbHz) * coherentS;

/** Threshold on the sum of K squares in sigma^2 for a false-alarm probability per cell. */
export const thresholdSigma2 = (falseAlarmPerCell: number, sums: number): number =>
  chiSquareInverseSurvival(falseAlarmPerCell, 2 * sums);

/** False-alarm probability per cell of a threshold in sigma^2. */
export const falseAlarmOfThreshold = (threshold: number, sums: number): number =>
  chiSquareSurvival(threshold, 2 * sums);

/** Detection probability of K sums of ratio rho each; generalised Marcum Q, Kaplan & Hegarty (5.53). */
export const detectionProbability = (threshold: number, sums: number, rho: number): number =>
  noncentralChiSquareSurvival(threshold, 2 * sums, 2 * sums * rho);

/** False-alarm probability of a search over independent cells, 1 - (1 - p)^N. */
export const falseAlarmPerSearch = (perCell: number, cells: number): number => -expm1(cells * log1p(-perCell));

/** False-alarm probability that each of N independent cells may have, 1 - (1 - P)^(1/N). */
export const falseAlarmPerCell = (perSearch: number, cells: number): number => -expm1(log1p(-perSearch) / cells);

/** Probability that at least M of N tries succeed, each with probability p: Kaplan & Hegarty 5.8.2. */
export function atLeastOf(m: number, n: number, p: number): number {
  let sum = 0;
  for (let k = m; k <= n; k++) {
    let term = 1;
    for (let i = 0; i < k; i++) term *= ((n - i) / (i + 1)) * p;
    for (let i = k; i < n; i++) term *= 1 - p;
    sum += term;
  }
  return sum;
}

/**
 * Probability that the right cell is the largest of N, one sum each: the mean over u in (0, 1) of the chance to exceed the
 * largest of N - 1 noise cells, whose law is u = (1 - exp(-x/2))^(N-1). Order statistics; midpoint rule, error below 1e-5.
 */
export function largestOfCells(cells: number, rho: number): number {
  const steps = 2000;
  let sum = 0;
  for (let n = 0; n < steps; n++) {
    const u = (n + 0.5) / steps;
    const largest = -2 * log(-expm1(log(u) / (cells - 1)));
    sum += noncentralChiSquareSurvival(largest, 2, 2 * rho);
  }
  return sum / steps;
}

/** Loss in dB of a coherent sum whose replica is off by a frequency: -20 log10 |sin(pi f T)/(pi f T)|. Textbook. */
export function dopplerLossDb(offsetHz: number, coherentS: number): number {
  const turns = offsetHz * coherentS;
  return turns === 0 ? 0 : -2 * decibels(Math.abs(sinTurns(turns / 2) / (PI * turns)));
}

/** Loss in dB of a replica off by tau chips, |tau| < 1, infinite bandwidth: -20 log10(1 - |tau|). */
export const codeLossDb = (offsetChips: number): number => -2 * decibels(1 - Math.abs(offsetChips));

/** Loss in dB of a coherent sum in which the data bit flips at a fraction of the time: -20 log10 |1 - 2a|. */
export const bitFlipLossDb = (fraction: number): number => -2 * decibels(Math.abs(1 - 2 * fraction));

/** Detectability factor of a pair (Pfa, Pd) for the non-coherent loss: Tsui, "Fundamentals of GPS Receivers". */
export function detectability(falseAlarm: number, detection: number): number {
  const root = erfcInverse(2 * falseAlarm) - erfcInverse(2 * detection);
  return root * root;
}

/** Non-coherent loss of n sums in dB, after Barton as given in Tsui; an approximation, see `squaringLossDb`. */
export function nonCoherentLossDb(sums: number, factor: number): number {
  const of = (n: number) => 1 + Math.sqrt(1 + (9.2 * n) / factor);
  return decibels(of(sums) / of(1));
}

/** Ratio rho that each of M sums needs to meet (Pfa per cell, Pd). Exact inversion by halving, 1e-12 relative. */
export function requiredSnr(sums: number, falseAlarm: number, detection: number): number {
  const threshold = thresholdSigma2(falseAlarm, sums);
  let low = 0;
  let high = 1;
  while (detectionProbability(threshold, sums, high) < detection) high *= 2;
  while (high - low > 1e-12 * high) {
    const middle = (low + high) / 2;
    if (detectionProbability(threshold, sums, middle) < detection) low = middle;
    else high = middle;
  }
  return high;
}

/** What M sums lose against one coherent sum of the same total time, in dB: 10 log10(M rho_M / rho_1). Exact. */
export const squaringLossDb = (sums: number, falseAlarm: number, detection: number): number =>
  decibels((sums * requiredSnr(sums, falseAlarm, detection)) / requiredSnr(1, falseAlarm, detection));

/** Cells of a search, N chips / step * (2 f / bin + 1). Common practice, no source. */
export const searchCells = (lengthChips: number, stepChips: number, halfWidthHz: number, binHz: number): number =>
  (lengthChips / stepChips) * ((2 * halfWidthHz) / binHz + 1);

/** Time in s when the cells are tried one after the other by a number of correlators. */
export const searchTimeS = (cells: number, coherentS: number, sums: number, correlators: number): number =>
  (cells * coherentS * sums) / correlators;
