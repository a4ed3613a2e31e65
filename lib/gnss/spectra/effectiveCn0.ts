import { decibels, pow10Db } from "@/lib/numeric/elementary";

/** An interference as the correlator feels it. */
export type Jamming = {
  /** Its power to the signal's power. */
  jsDb: number;
  /** Spectral separation in 1/Hz; 1/(Q Rc) where Q is used instead. */
  separationPerHz: number;
};

/** Separation that stands for a resistance Q at a chip rate, 1/(Q Rc), in 1/Hz. */
export const separationOfFactor = (factor: number, chipRateHz: number): number => 1 / (factor * chipRateHz);

/**
 * C/N0 in dB-Hz under interference: 1/(1/(C/N0) + sum of (J/S) kappa). Betz; Kaplan & Hegarty, "Understanding GPS", 2nd
 * edition, chapter 6.
 * @param jamming any number, uncorrelated
 */
export function effectiveCn0DbHz(cn0DbHz: number, jamming: readonly Jamming[]): number {
  const noise = jamming.reduce(
    (sum, { jsDb, separationPerHz }) => sum + pow10Db(jsDb) * separationPerHz,
    pow10Db(-cn0DbHz),
  );
  return -decibels(noise);
}

/**
 * J/S in dB at which C/N0 falls to a given value: 10 log10((1/eff - 1/(C/N0))/kappa). Same source.
 * @returns -Infinity when the signal is no better than that without any interference
 */
export function toleratedJsDb(cn0DbHz: number, effectiveDbHz: number, separationPerHz: number): number {
  const room = pow10Db(-effectiveDbHz) - pow10Db(-cn0DbHz);
  return room > 0 ? decibels(room / separationPerHz) : -Infinity;
}
