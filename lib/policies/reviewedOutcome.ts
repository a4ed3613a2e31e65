import { requirementMet, type Requirement } from "./requirement";

/** A case with what its record says, and what a corrected marking says of it. */
export type ReviewedCase = { checkId: string; metBefore: boolean; met: boolean };

/** Whether the release's requirement is met by the records as they are, and as the corrected marking would have them. */
export function reviewedOutcome(
  require: Requirement,
  cases: readonly ReviewedCase[],
): { before: boolean; now: boolean } {
  const met = (of: "metBefore" | "met") =>
    requirementMet(require, new Set(cases.filter((one) => one[of]).map(({ checkId }) => checkId)));
  return { before: met("metBefore"), now: met("met") };
}
