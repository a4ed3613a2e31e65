import type { CautionTopic, QuantityDefinition } from "../kind";

export const searchPlanCautions: readonly CautionTopic[] = ["life"];

export const searchPlanQuantities: readonly QuantityDefinition[] = [
  {
    id: "detection",
    label: "Detection your plan attains",
    unit: "%",
    tolerance: { value: 1, unit: "%" },
    toleranceRange: { from: 0.5, to: 5, unit: "%" },
    critical: false,
    reason: "The server draws 5 000 satellites for your plan; their mean is good to a few tenths of a point.",
  },
  {
    id: "falseAlarm",
    label: "False alarms your plan attains",
    unit: "1",
    tolerance: { value: 3, unit: "%" },
    toleranceRange: { from: 0.5, to: 20, unit: "%" },
    critical: false,
    reason: "A threshold rounded to one tenth moves the false alarms by up to 2.5 %.",
  },
  {
    id: "time",
    label: "Time your plan takes",
    unit: "s",
    tolerance: null,
    toleranceRange: null,
    critical: false,
    reason: "Cells, coherent time and sums over the number of correlators; a limit is a limit.",
  },
  {
    id: "ownDetection",
    label: "Your estimate of the detection",
    unit: "%",
    tolerance: { value: 5, unit: "%" },
    toleranceRange: { from: 1, to: 10, unit: "%" },
    critical: false,
    reason: "Mean losses inside a bin, a code step and a data bit can be estimated this well.",
  },
  {
    id: "ownFalseAlarm",
    label: "Your estimate of the false alarms",
    unit: "1",
    tolerance: { value: 2, unit: "1" },
    toleranceRange: { from: 1.2, to: 5, unit: "1" },
    critical: false,
    reason: "A factor: the tail of a chi-square law is read off tables this well.",
  },
  {
    id: "ownTime",
    label: "Your estimate of the time",
    unit: "s",
    tolerance: { value: 10, unit: "%" },
    toleranceRange: { from: 1, to: 25, unit: "%" },
    critical: false,
    reason: "A product of counts.",
  },
];
