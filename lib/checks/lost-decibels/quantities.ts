import type { CautionTopic, QuantityDefinition } from "../kind";

export type Cause = "blockage" | "interference" | "loss" | "water" | "nothing";

export const CAUSES: readonly { value: Cause; label: string }[] = [
  { value: "blockage", label: "A part of the sky is blocked" },
  { value: "interference", label: "Interference" },
  { value: "loss", label: "Amplifier or cable has lost gain" },
  { value: "water", label: "Water is getting into the cable" },
  { value: "nothing", label: "Nothing is wrong" },
];

/** What to do next on site, each named by the cause that calls for it. */
export const ACTS: readonly { value: Cause; label: string }[] = [
  { value: "loss", label: "Measure voltage and current of the feed, then amplifier and cable" },
  { value: "nothing", label: "No visit: keep the log as the pattern of this station" },
  { value: "blockage", label: "Look from the antenna at what stands in those azimuths" },
  { value: "water", label: "Open, dry and remake the joints; change the wet cable" },
  { value: "interference", label: "Leave the antenna alone; look for the signal with a spectrum analyser" },
];

export const lostDecibelsQuantities: readonly QuantityDefinition[] = [
  {
    id: "cause",
    label: "Cause",
    unit: null,
    choices: CAUSES,
    tolerance: null,
    toleranceRange: null,
    critical: true,
    reason: "It decides whether a rigger goes up, a spectrum analyser goes out, or nobody goes.",
  },
  {
    id: "start",
    label: "Start",
    unit: "s",
    tolerance: { value: 30, unit: "s" },
    toleranceRange: { from: 30, to: 120, unit: "s" },
    critical: false,
    reason: "Readings are 10 to 30 s apart. The foot of a slow fall lies in the noise.",
  },
  {
    id: "stop",
    label: "Stop",
    unit: "s",
    tolerance: { value: 30, unit: "s" },
    toleranceRange: { from: 30, to: 120, unit: "s" },
    critical: false,
    reason: "Readings are 10 to 30 s apart.",
  },
  {
    id: "azimuths",
    label: "Azimuths that fell",
    unit: "deg",
    tolerance: { value: 10, unit: "deg" },
    toleranceRange: { from: 5, to: 20, unit: "deg" },
    critical: false,
    reason: "An edge is seen only where a satellite crosses it.",
  },
  {
    id: "depth",
    label: "Depth of the fall",
    unit: "dB",
    tolerance: { value: 1, unit: "dB" },
    toleranceRange: { from: 0.5, to: 2, unit: "dB" },
    critical: false,
    reason: "The log has whole dB-Hz; several satellites together give half a dB.",
  },
  {
    id: "act",
    label: "Next act on site",
    unit: null,
    choices: ACTS,
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "The cause is found to be acted on.",
  },
  {
    id: "high",
    label: "Mean C/N0 above 60°",
    unit: "dB-Hz",
    tolerance: { value: 0.5, unit: "dB-Hz" },
    toleranceRange: { from: 0.3, to: 1.5, unit: "dB-Hz" },
    critical: false,
    reason: "A mean of many readings. It is what the next log is held against.",
  },
  {
    id: "low",
    label: "Mean C/N0 from 10° to 20°",
    unit: "dB-Hz",
    tolerance: { value: 0.5, unit: "dB-Hz" },
    toleranceRange: { from: 0.3, to: 1.5, unit: "dB-Hz" },
    critical: false,
    reason: "A mean of many readings. What low satellites lack by elevation alone is no fault.",
  },
];

export const lostDecibelsCautions: readonly CautionTopic[] = ["height", "lightning", "mains", "rf", "life"];
