import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { LocateTruth } from "./drawCase";
import { mark } from "./mark";
import { locateParameters, type LocateParameters } from "./parameters";
import { locateCautions, locateQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** F4: locate an interferer from a patrol log. */
export const locate: CheckKind<LocateParameters, LocateTruth> = {
  id: "locate",
  version: 1,
  letter: "F4",
  title: "Locate from a patrol log",
  defaultMinutes: 40,
  parameters: locateParameters,
  quantities: locateQuantities,
  cautions: locateCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
