import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { ChainTruth } from "./drawCase";
import { mark } from "./mark";
import { chainParameters, type ChainParameters } from "./parameters";
import { chainCautions, chainQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** E1: an antenna chain, open design. */
export const chain: CheckKind<ChainParameters, ChainTruth> = {
  id: "chain",
  version: 1,
  letter: "E1",
  title: "Antenna chain",
  defaultMinutes: 35,
  parameters: chainParameters,
  quantities: chainQuantities,
  cautions: chainCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
