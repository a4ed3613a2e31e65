import type { CautionTopic, QuantityDefinition } from "../kind";
import { CLASS_CHOICES } from "./classes";

export const interfererCautions: readonly CautionTopic[] = ["transmit", "life"];

export const interfererQuantities: readonly QuantityDefinition[] = [
  {
    id: "class",
    label: "What it is",
    unit: null,
    choices: CLASS_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "The class decides who is sent, and what is looked for.",
  },
  {
    id: "centre",
    label: "Centre",
    unit: "kHz",
    tolerance: { value: 10, unit: "kHz" },
    toleranceRange: { from: 2, to: 50, unit: "kHz" },
    critical: false,
    reason: "Or 2 % of offset or bandwidth, whichever is most: no more can be seen of something wide.",
  },
  {
    id: "bandwidth",
    label: "Bandwidth at 6 dB",
    unit: "kHz",
    tolerance: { value: 20, unit: "%" },
    toleranceRange: { from: 10, to: 40, unit: "%" },
    critical: false,
    reason: "Resolution, lines and noise all move the two edges; of a single carrier up to 10 kHz is resolution.",
  },
  {
    id: "period",
    label: "Repetition",
    unit: "us",
    tolerance: { value: 5, unit: "%" },
    toleranceRange: { from: 1, to: 10, unit: "%" },
    critical: false,
    reason: "Ten repetitions measured to half of one give it.",
  },
  {
    id: "level",
    label: "Level over the floor",
    unit: "dB",
    tolerance: { value: 1.5, unit: "dB" },
    toleranceRange: { from: 0.5, to: 3, unit: "dB" },
    critical: false,
    reason: "A power and a floor, each read to within a dB.",
  },
  {
    id: "floor",
    label: "Noise floor",
    unit: "dB",
    tolerance: { value: 1, unit: "dB" },
    toleranceRange: { from: 0.5, to: 2, unit: "dB" },
    critical: false,
    reason: "Read where nothing stands; asked in every case, so that nothing there has to be measured as well.",
  },
  {
    id: "ownLine",
    label: "The receiver's own line",
    unit: "dB",
    tolerance: { value: 1.5, unit: "dB" },
    toleranceRange: { from: 0.5, to: 3, unit: "dB" },
    critical: false,
    reason: "Whoever knows how strong the own line is does not report it as a carrier.",
  },
];
