import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { FalseLockTruth } from "./drawScene";
import { mark } from "./mark";
import { falseLockParameters, type FalseLockParameters } from "./parameters";
import { falseLockCautions, falseLockQuantities } from "./quantities";
import { solve } from "./solve";
import { falseLockTrial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** A2: a false lock on a blocked satellite. */
export const falseLock: CheckKind<FalseLockParameters, FalseLockTruth> = {
  id: "false-lock",
  version: 1,
  letter: "A2",
  title: "False lock on a blocked satellite",
  defaultMinutes: 45,
  parameters: falseLockParameters,
  quantities: falseLockQuantities,
  cautions: falseLockCautions,
  build: buildCase,
  mark,
  solve,
  wrongMethods,
  trial: falseLockTrial,
};
