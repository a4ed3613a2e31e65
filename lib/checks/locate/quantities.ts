import type { CautionTopic, QuantityDefinition } from "../kind";
import { BANDS } from "./bands";

export const locateCautions: readonly CautionTopic[] = ["transmit", "rf", "life"];

export const PRESENCE_CHOICES = [
  { value: "always", label: "Heard at every stop" },
  { value: "times", label: "Heard at some stops only" },
] as const;

export const ACTION_CHOICES = [
  { value: "report", label: "Keep away, look from public ground only, report" },
  { value: "ask", label: "Go in and ask the holder to stop it" },
  { value: "switch-off", label: "Switch the device off" },
  { value: "take", label: "Take the device along as evidence" },
  { value: "transmit", label: "Transmit on the frequency and watch what it does" },
] as const;

export const locateQuantities: readonly QuantityDefinition[] = [
  {
    id: "position",
    label: "Transmitter inside your ellipse",
    unit: null,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "The ellipse is what the authority searches; a place without one says nothing.",
  },
  {
    id: "area",
    label: "Area of your ellipse",
    unit: "1",
    tolerance: { value: 2, unit: "1" },
    toleranceRange: { from: 1.3, to: 5, unit: "1" },
    critical: false,
    reason:
      "Times that of weighted least squares without the reflection: a wider ellipse holds everything and helps nobody.",
  },
  {
    id: "reflection",
    label: "Stop that saw a reflection",
    unit: "1",
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "Its bearing misses the others by many of its own spreads.",
  },
  {
    id: "band",
    label: "Band that is hit",
    unit: null,
    choices: BANDS.map(({ value, label }) => ({ value, label })),
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "It decides who at the authority takes the report and which users are warned.",
  },
  {
    id: "presence",
    label: "How often it was heard",
    unit: null,
    choices: PRESENCE_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "An interferer that is off at times is looked for at other hours.",
  },
  {
    id: "action",
    label: "What you do there",
    unit: null,
    choices: ACTION_CHOICES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "Confronting a holder, operating a found device or transmitting endangers people and is not ours to do.",
  },
];
