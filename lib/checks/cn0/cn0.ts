import type { CheckKind } from "../kind";
import { buildCase } from "./buildCase";
import type { Cn0Truth } from "./drawCase";
import { mark } from "./mark";
import { cn0Parameters, type Cn0Parameters } from "./parameters";
import { cn0Cautions, cn0Quantities } from "./quantities";
import { solve } from "./solve";
import { trial } from "./trial";
import { wrongMethods } from "./wrongMethods";

/** D1: C/N0 from the prompts of four channels. */
export const cn0: CheckKind<Cn0Parameters, Cn0Truth> = {
  id: "cn0",
  version: 1,
  letter: "D1",
  title: "C/N0 from prompts",
  defaultMinutes: 25,
  parameters: cn0Parameters,
  quantities: cn0Quantities,
  cautions: cn0Cautions,
  build: buildCase,
  mark,
  solve: ({ publicCase }) => solve(publicCase),
  wrongMethods,
  trial,
};
