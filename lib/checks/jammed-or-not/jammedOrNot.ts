import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { JammedOrNotTruth } from "./drawCase";
import { mark } from "./mark";
import { jammedOrNotParameters, type JammedOrNotParameters } from "./parameters";
import { jammedOrNotCautions, jammedOrNotQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** F5: jammed, deceived, blocked or faulty, from a receiver's own instruments. */
export const jammedOrNot: CheckKind<JammedOrNotParameters, JammedOrNotTruth> = {
  id: "jammed-or-not",
  version: 1,
  letter: "F5",
  title: "Jammed, deceived, blocked or faulty",
  defaultMinutes: 30,
  parameters: jammedOrNotParameters,
  quantities: jammedOrNotQuantities,
  cautions: jammedOrNotCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
