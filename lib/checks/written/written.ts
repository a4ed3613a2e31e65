import type { CheckKind } from "../kind";
import type { WrittenParameters } from "./parameters";
import { publicCase } from "./publicCase";
import { writtenQuantities } from "./quantities";

/** A short written account, which an assessor judges line by line and no machine marks. Outside the catalogue. */
export const written: CheckKind<WrittenParameters, Record<string, never>> = {
  id: "written",
  version: 1,
  letter: "",
  title: "Written account",
  defaultMinutes: 30,
  parameters: [],
  quantities: [],
  cautions: ["life"],
  judged: true,
  build: (_seedHex, plan) => ({ truth: {}, publicCase: publicCase(plan), files: [], draws: 1 }),
  mark() {
    throw new Error("written: an assessor judges it, see judgeLines");
  },
  // Nobody but a person can write it.
  solve: () => ({}),
  wrongMethods: {},
  ofPlan: { quantities: writtenQuantities, wrongMethods: () => ({}) },
};
