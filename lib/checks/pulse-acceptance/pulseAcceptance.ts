import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { PulseAcceptanceTruth } from "./drawCase";
import { mark } from "./mark";
import { pulseAcceptanceParameters, type PulseAcceptanceParameters } from "./parameters";
import { pulseAcceptanceCautions, pulseAcceptanceQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** H3: a day of a receiver's 1PPS against a reference. */
export const pulseAcceptance: CheckKind<PulseAcceptanceParameters, PulseAcceptanceTruth> = {
  id: "pulse-acceptance",
  version: 1,
  letter: "H3",
  title: "1PPS against a reference",
  defaultMinutes: 35,
  parameters: pulseAcceptanceParameters,
  quantities: pulseAcceptanceQuantities,
  cautions: pulseAcceptanceCautions,
  build: buildCase,
  mark,
  solve: (built) => solve(built),
  wrongMethods,
  trial,
};
