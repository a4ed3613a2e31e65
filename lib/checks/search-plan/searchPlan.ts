import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { SearchPlanTruth } from "./drawCase";
import { mark } from "./mark";
import { searchPlanParameters, type SearchPlanParameters } from "./parameters";
import { searchPlanCautions, searchPlanQuantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** B2: a search plan, open design. */
export const searchPlan: CheckKind<SearchPlanParameters, SearchPlanTruth> = {
  id: "search-plan",
  version: 1,
  letter: "B2",
  title: "Search plan",
  defaultMinutes: 40,
  parameters: searchPlanParameters,
  quantities: searchPlanQuantities,
  cautions: searchPlanCautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
