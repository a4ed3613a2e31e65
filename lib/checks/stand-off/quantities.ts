import type { CautionTopic, QuantityDefinition } from "../kind";

export const standOffCautions: readonly CautionTopic[] = ["transmit", "life"];

export const standOffQuantities: readonly QuantityDefinition[] = [
  {
    id: "received",
    label: "Interference at the antenna",
    unit: "dBm",
    tolerance: { value: 1, unit: "dB" },
    toleranceRange: { from: 0.5, to: 3, unit: "dB" },
    critical: false,
    reason: "A sum of five levels; each may be rounded to a few tenths.",
  },
  {
    id: "effective",
    label: "Effective C/N0",
    unit: "dB-Hz",
    tolerance: { value: 1, unit: "dB" },
    toleranceRange: { from: 0.5, to: 3, unit: "dB" },
    critical: false,
    reason: "A formula, judged from your own level of the interference; a wrong Q moves it by 1.7 dB or more.",
  },
  {
    id: "usable",
    label: "Satellites still usable",
    unit: "1",
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "A count, judged from your own values of effective C/N0.",
  },
  {
    id: "recovery",
    label: "Distance of recovery",
    unit: "m",
    tolerance: { value: 12, unit: "%" },
    toleranceRange: { from: 5, to: 30, unit: "%" },
    critical: false,
    reason:
      "Half a dB at path exponent 2 is 6 %. Judged on its own: it says where the spare antenna goes, whatever stood before it.",
  },
];
