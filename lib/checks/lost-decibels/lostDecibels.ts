import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { LostDecibelsTruth } from "./drawCase";
import { mark } from "./mark";
import { lostDecibelsParameters, type LostDecibelsParameters } from "./parameters";
import { lostDecibelsCautions, lostDecibelsQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** D2: what took the decibels out of a day's log. */
export const lostDecibels: CheckKind<LostDecibelsParameters, LostDecibelsTruth> = {
  id: "lost-decibels",
  version: 1,
  letter: "D2",
  title: "What took the decibels",
  defaultMinutes: 30,
  parameters: lostDecibelsParameters,
  quantities: lostDecibelsQuantities,
  cautions: lostDecibelsCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
