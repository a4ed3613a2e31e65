import { integrate } from "@/lib/numeric/quadrature";
import { integrateBand } from "./integrateBand";
import type { Modulation } from "./modulation";
import { powerInBand } from "./powerInBand";
import { powerSpectralDensity } from "./powerSpectralDensity";

/** Spectrum of something that disturbs a signal, power 1. Offsets from the signal's carrier. */
export type InterferenceSpectrum =
  | { kind: "line"; offsetHz: number }
  /** Even over a width. */
  | { kind: "band"; offsetHz: number; widthHz: number }
  /** Another code on the same carrier. */
  | { kind: "code"; modulation: Modulation };

const WIDE_CHIPS = 200; // product of two densities beyond +-100 chip rates: below 1e-7 of the whole

/**
 * Spectral separation coefficient in 1/Hz: kappa = int G_i G_s df over the receiver's band, both of power 1 over all
 * frequencies. Betz, "Effect of partial-band interference on receiver estimation of C/N0" (2001). For two BPSK signals
 * alike it is 2/(3 Rc). Codes are taken as random; one pair of short codes, whose spectra are lines, may differ by
 * several dB.
 * @param bandwidthHz two-sided, centred on the signal; null for no limit
 */
export function spectralSeparation(
  interference: InterferenceSpectrum,
  signal: Modulation,
  bandwidthHz: number | null,
): number {
  const half = bandwidthHz === null ? Infinity : bandwidthHz / 2;
  const density = (offsetHz: number) => powerSpectralDensity(signal, offsetHz);
  if (interference.kind === "line") {
    return Math.abs(interference.offsetHz) <= half ? density(interference.offsetHz) : 0;
  }
  if (interference.kind === "code") {
    const { modulation } = interference;
    const rateHz = Math.max(signal.chipRateHz, modulation.chipRateHz);
    const product = (offsetHz: number) => density(offsetHz) * powerSpectralDensity(modulation, offsetHz);
    return integrateBand(product, bandwidthHz ?? WIDE_CHIPS * rateHz, [signal, modulation]);
  }
  const { offsetHz, widthHz } = interference;
  if (!(widthHz > 0)) throw new RangeError(`spectralSeparation: width above 0 Hz, got ${widthHz}`);
  const from = Math.max(offsetHz - widthHz / 2, -half);
  const to = Math.min(offsetHz + widthHz / 2, half);
  if (!(to > from)) return 0;
  return integrate(density, from, to, Math.ceil((2 * (to - from)) / signal.chipRateHz)) / widthHz;
}

/**
 * Resistance Q of a signal against an interference: Q = int S_s / (Rc int S_j S_s), 1 for a line on the carrier, 1.5
 * for a matched BPSK code, 2.22 for noise over the main lobe. Kaplan & Hegarty, "Understanding GPS", 2nd edition,
 * chapter 6; values from memory, reproduced by the integrals.
 * @param bandwidthHz two-sided; null for no limit
 */
export function interferenceFactor(
  interference: InterferenceSpectrum,
  signal: Modulation,
  bandwidthHz: number | null,
): number {
  const inBand = bandwidthHz === null ? 1 : powerInBand(signal, bandwidthHz);
  return inBand / (signal.chipRateHz * spectralSeparation(interference, signal, bandwidthHz));
}
