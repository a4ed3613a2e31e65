import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { CorrelatorReadingTruth } from "./drawCase";
import { mark } from "./mark";
import { correlatorReadingParameters, type CorrelatorReadingParameters } from "./parameters";
import { correlatorReadingCautions, correlatorReadingQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** A1: read one correlator trace. */
export const correlatorReading: CheckKind<CorrelatorReadingParameters, CorrelatorReadingTruth> = {
  id: "correlator-reading",
  version: 1,
  letter: "A1",
  title: "Read the correlator",
  defaultMinutes: 15,
  parameters: correlatorReadingParameters,
  quantities: correlatorReadingQuantities,
  cautions: correlatorReadingCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
