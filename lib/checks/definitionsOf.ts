import type { CheckKind, CheckPlan, QuantityDefinition, WrongMethod } from "./kind";

/** The quantities a check can ask: those of its kind, or those that the lead has written into the plan. */
export const quantitiesOf = (
  kind: Pick<CheckKind, "quantities" | "ofPlan">,
  plan: CheckPlan,
): readonly QuantityDefinition[] => kind.ofPlan?.quantities(plan) ?? kind.quantities;

/** The wrong methods a check is tried with, by the same rule. */
export const wrongMethodsOf = (
  kind: Pick<CheckKind, "wrongMethods" | "ofPlan">,
  plan: CheckPlan,
): Readonly<Record<string, WrongMethod>> => kind.ofPlan?.wrongMethods(plan) ?? kind.wrongMethods;
