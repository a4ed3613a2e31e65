import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { SkyViewTruth } from "./drawCase";
import { mark } from "./mark";
import { skyViewParameters, skyViewParametersProblem, type SkyViewParameters } from "./parameters";
import { skyViewCautions, skyViewQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** E3: which position on a roof sees enough sky and stands clear of what radiates there. */
export const skyView: CheckKind<SkyViewParameters, SkyViewTruth> = {
  id: "sky-view",
  version: 1,
  letter: "E3",
  title: "Sky view",
  defaultMinutes: 35,
  parameters: skyViewParameters,
  quantities: skyViewQuantities,
  cautions: skyViewCautions,
  parametersProblem: skyViewParametersProblem,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
