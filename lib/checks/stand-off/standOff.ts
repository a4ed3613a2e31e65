import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { StandOffTruth } from "./drawCase";
import { mark } from "./mark";
import { standOffParameters, type StandOffParameters } from "./parameters";
import { standOffCautions, standOffQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** F2: J/S and stand-off. */
export const standOff: CheckKind<StandOffParameters, StandOffTruth> = {
  id: "stand-off",
  version: 1,
  letter: "F2",
  title: "How far away must it be",
  defaultMinutes: 30,
  parameters: standOffParameters,
  quantities: standOffQuantities,
  cautions: standOffCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
