import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { DelayEntryTruth } from "./drawCase";
import { mark } from "./mark";
import { delayEntryParameters, type DelayEntryParameters } from "./parameters";
import { delayEntryCautions, delayEntryQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** H1: the delay to enter in a timing receiver, with its sign. */
export const delayEntry: CheckKind<DelayEntryParameters, DelayEntryTruth> = {
  id: "delay-entry",
  version: 1,
  letter: "H1",
  title: "Delay to enter",
  defaultMinutes: 25,
  parameters: delayEntryParameters,
  quantities: delayEntryQuantities,
  cautions: delayEntryCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
