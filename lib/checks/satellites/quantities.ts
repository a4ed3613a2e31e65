import type { CautionTopic, QuantityDefinition } from "../kind";

export const satellitesCautions: readonly CautionTopic[] = ["transmit", "life"];

export const satellitesQuantities: readonly QuantityDefinition[] = [
  {
    id: "found",
    label: "Satellites found",
    unit: null,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "A satellite this strong is found by any sound search.",
  },
  {
    id: "invented",
    label: "None invented",
    unit: null,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "A satellite that is not there puts a false range into a position.",
  },
  {
    id: "codePhase",
    label: "Code phase at the first sample",
    unit: "chip",
    tolerance: { value: 0.5, unit: "chip" },
    toleranceRange: { from: 0.25, to: 1, unit: "chip" },
    critical: false,
    reason: "A search grid of half a chip, and noise.",
  },
  {
    id: "doppler",
    label: "Doppler",
    unit: "Hz",
    tolerance: { value: 250, unit: "Hz" },
    toleranceRange: { from: 25, to: 500, unit: "Hz" },
    critical: false,
    reason: "Nobody can read finer than the bins searched, so half of your own bin counts.",
  },
  {
    id: "cn0",
    label: "C/N0",
    unit: "dB-Hz",
    tolerance: { value: 2, unit: "dB-Hz" },
    toleranceRange: { from: 1, to: 4, unit: "dB-Hz" },
    critical: false,
    reason: "A peak read off a grid loses up to 2 dB between cells.",
  },
];
