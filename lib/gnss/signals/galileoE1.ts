import { L1_HZ } from "../constants";

/** Amplitude of the slow and the fast subcarrier: 10/11 and 1/11 of the power. Galileo OS SIS ICD, issue 2, 2.3.3. */
export const SLOW_AMPLITUDE = Math.sqrt(10 / 11);
export const FAST_AMPLITUDE = Math.sqrt(1 / 11);

/** What the two components of E1 have in common; each has half of the power. */
export const galileoE1 = {
  carrierHz: L1_HZ,
  chipRateHz: 1.023e6,
  lengthChips: 4092,
  source: "Galileo OS SIS ICD, issue 2, Annex C",
} as const;
