import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { InterfererTruth } from "./drawCase";
import { mark } from "./mark";
import { interfererParameters, type InterfererParameters } from "./parameters";
import { interfererCautions, interfererQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** F1: name the interferer in a capture. */
export const interferer: CheckKind<InterfererParameters, InterfererTruth> = {
  id: "interferer",
  version: 1,
  letter: "F1",
  title: "Name the interferer",
  defaultMinutes: 30,
  parameters: interfererParameters,
  quantities: interfererQuantities,
  cautions: interfererCautions,
  build: buildCase,
  mark,
  solve,
  wrongMethods,
  trial,
};
