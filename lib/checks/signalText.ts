import { formatQuantity } from "./formatQuantity";

export type Signal = { codePhaseChips: number; dopplerHz: number; cn0DbHz: number };

/** Code phase, Doppler and C/N0 of one signal, for workings. */
export const signalText = ({ codePhaseChips, dopplerHz, cn0DbHz }: Signal): string =>
  [
    formatQuantity(codePhaseChips, "chip", 2),
    formatQuantity(dopplerHz, "Hz", 0),
    formatQuantity(cn0DbHz, "dB-Hz", 1),
  ].join(", ");
