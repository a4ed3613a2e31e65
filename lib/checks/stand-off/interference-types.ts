/** How the interference lies in the band of the C/A code, and the Q that goes with it. */
export type InterferenceType = "carrier" | "code" | "noise";

/**
 * Q of J/S over Q times chip rate: Kaplan & Hegarty, "Understanding GPS", 2nd edition, chapter 6 (values from memory; each
 * follows from the overlap of the two spectra).
 */
export const Q_OF: Readonly<Record<InterferenceType, number>> = { carrier: 1, code: 1.5, noise: 2.22 };

export const INTERFERENCE_TEXT: Readonly<Record<InterferenceType, string>> = {
  carrier: "a single carrier on 1\u2009575.42\u00a0MHz",
  code: "a signal with the spectrum of the C/A code, on 1\u2009575.42\u00a0MHz",
  noise: "noise, even over 1\u2009575.42\u00a0MHz ±\u00a01.023\u00a0MHz",
};
