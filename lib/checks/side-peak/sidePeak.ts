import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { SidePeakTruth } from "./drawCase";
import { mark } from "./mark";
import { sidePeakParameters, type SidePeakParameters } from "./parameters";
import { sidePeakCautions, sidePeakQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** A3: main or side peak of a BOC(1,1). */
export const sidePeak: CheckKind<SidePeakParameters, SidePeakTruth> = {
  id: "side-peak",
  version: 1,
  letter: "A3",
  title: "Side-peak lock",
  defaultMinutes: 20,
  parameters: sidePeakParameters,
  quantities: sidePeakQuantities,
  cautions: sidePeakCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
