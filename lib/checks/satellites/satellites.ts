import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { SatellitesTruth } from "./drawScene";
import { mark } from "./mark";
import { satellitesParameters, type SatellitesParameters } from "./parameters";
import { satellitesCautions, satellitesQuantities } from "./quantities";
import { solve } from "./solve";
import { satellitesTrial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** B1: which satellites are in the capture. */
export const satellites: CheckKind<SatellitesParameters, SatellitesTruth> = {
  id: "satellites",
  version: 1,
  letter: "B1",
  title: "Which satellites are in the capture",
  defaultMinutes: 40,
  parameters: satellitesParameters,
  quantities: satellitesQuantities,
  cautions: satellitesCautions,
  parametersProblem: ({ cn0, foundFrom }) =>
    cn0[1] >= foundFrom + 1
      ? null
      : {
          name: "foundFrom",
          message: "C/N0 must reach at least 1 dB above the level from which satellites must be found.",
        },
  build: buildCase,
  mark,
  solve,
  wrongMethods,
  trial: satellitesTrial,
};
