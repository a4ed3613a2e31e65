import { cosTurns, sinTurns } from "@/lib/numeric/elementary";
import type { Random } from "@/lib/numeric/random";
import type { Modulation } from "../spectra/modulation";
import { powerSpectralDensity } from "../spectra/powerSpectralDensity";

/** Lags in a row, in chips. */
export type Lags = { fromChips: number; stepChips: number; count: number };

const LINES_PER_CHIP_RATE = 16; // so the noise comes back after 16 chips; a longer stretch is refused

/**
 * White noise behind an ideal low-pass filter of two-sided bandwidth B, correlated with the replica of a signal: the sum
 * of lines of random size over +-B/2, as strong as G(f) there. Neighbouring lags share noise as in an instrument; a random
 * code is taken.
 * @returns real and imaginary parts alternating; variance in each the share of the signal's power in the band, so 1
 *   without a filter
 */
export function traceNoise(modulation: Modulation, bandwidthHz: number, lags: Lags, random: Random): Float64Array {
  const { stepChips, count } = lags;
  const { chipRateHz } = modulation;
  if (!(bandwidthHz > 0)) throw new RangeError(`traceNoise: bandwidth above 0 Hz, got ${bandwidthHz}`);
  if (!(stepChips > 0 && stepChips * count <= LINES_PER_CHIP_RATE))
    throw new RangeError(`traceNoise: a stretch of at most ${LINES_PER_CHIP_RATE} chips, got ${stepChips * count}`);
  const edge = bandwidthHz / 2 / chipRateHz;
  const half = Math.ceil(edge * LINES_PER_CHIP_RATE);
  const noise = new Float64Array(2 * count);
  for (let line = -half; line < half; line++) {
    const perChip = ((line + 0.5) * edge) / half;
    const share = powerSpectralDensity(modulation, perChip * chipRateHz) * (edge / half) * chipRateHz;
    addLine(noise, perChip * stepChips, Math.sqrt(share), random);
  }
  return noise;
}

function addLine(noise: Float64Array, turnsPerLag: number, size: number, random: Random): void {
  const [turnRe, turnIm] = [cosTurns(turnsPerLag), sinTurns(turnsPerLag)];
  let [re, im] = [size * random.gaussian(), size * random.gaussian()];
  for (let at = 0; at < noise.length; at += 2) {
    noise[at] += re;
    noise[at + 1] += im;
    [re, im] = [re * turnRe - im * turnIm, re * turnIm + im * turnRe];
  }
}
