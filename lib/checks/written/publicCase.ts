import { askedQuantities } from "../askedQuantities";
import type { CheckPlan, PublicCase } from "../kind";
import { publicTolerances } from "../publicTolerances";
import { LONGEST_TEXT, type WrittenParameters } from "./parameters";
import { writtenQuantities } from "./quantities";

export const SECTION = "account";

/** The lines to write; nothing is drawn, so the case is the same for everybody. */
export function publicCase(plan: CheckPlan<WrittenParameters>): PublicCase {
  const asked = askedQuantities(writtenQuantities(plan), plan);
  const lines = [...asked.values()];
  return {
    kind: "written",
    version: 1,
    title: plan.title,
    brief: [
      "Write a short text for each line, in your own words. An assessor judges each line within or outside, and gives a reason for what is outside.",
    ],
    given: [],
    cautions: ["life"],
    sections: [
      {
        id: SECTION,
        title: "Your account",
        fields: lines.map(({ id, label }) => ({ id, label, input: "text", longest: LONGEST_TEXT, quantity: id })),
      },
    ],
    tolerances: publicTolerances(asked, Object.fromEntries(lines.map(({ id }) => [id, () => "judged"]))),
    data: {},
  };
}
