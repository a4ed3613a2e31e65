import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { FormulaTruth } from "./drawCase";
import { mark } from "./mark";
import type { FormulaParameters } from "./parameters";
import { formulaQuantities } from "./quantities";
import { solve } from "./solve";
import { formulaTrial } from "./trial";
import { formulaWrongMethods } from "./wrongMethods";

/** A check of the lead's own: givens drawn on a step, quantities by formula, wrong ways named. Outside the catalogue. */
export const formula: CheckKind<FormulaParameters, FormulaTruth> = {
  id: "formula",
  version: 1,
  letter: "",
  title: "Own quantities",
  defaultMinutes: 20,
  parameters: [],
  quantities: [],
  cautions: ["life"],
  build: buildCase,
  mark,
  solve: ({ publicCase }, plan) => solve(publicCase, plan),
  wrongMethods: {},
  ofPlan: { quantities: formulaQuantities, wrongMethods: formulaWrongMethods },
  trial: formulaTrial,
};
