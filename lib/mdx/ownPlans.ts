import type { CheckPlan } from "@/lib/checks/kind";
import { planFormula } from "@/lib/mdx/planFormula";
import { planWritten } from "@/lib/mdx/planWritten";
import type { Problem } from "@/lib/mdx/problem";
import type { WrittenCheck } from "@/lib/mdx/writtenTag";

/** What the tags inside a check say where its kind leaves everything to the lead. */
export type OwnPlan = Pick<CheckPlan, "title" | "parameters" | "quantities"> & { problems: Problem[] };

/** Kinds that are planned from the tags inside the check, by name. */
export const OWN_PLANS: Readonly<Record<string, (check: WrittenCheck) => OwnPlan>> = {
  formula: planFormula,
  written: planWritten,
};
