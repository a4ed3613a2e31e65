import { requirementMet, type Requirement } from "./requirement";

export type DecidableCase = {
  checkId: string;
  state: "building" | "open" | "handed in" | "marked";
  met: boolean | null;
};
export type Decidability = { decidable: true; requirementMet: boolean } | { decidable: false; reason: string };

/** A sitting goes to the decider when every check has its marking record, or the last day has passed. */
export function decidability(
  checks: readonly { id: string }[],
  require: Requirement,
  cases: readonly DecidableCase[],
  lastDayPassed: boolean,
): Decidability {
  if (cases.some(({ state }) => state !== "marked")) {
    return { decidable: false, reason: "A case of this sitting is still open or being marked." };
  }
  const marked = new Set(cases.map(({ checkId }) => checkId));
  if (!lastDayPassed && !checks.every(({ id }) => marked.has(id))) {
    return { decidable: false, reason: "Not every check of this sitting has its marking record." };
  }
  const met = new Set(cases.filter((one) => one.met).map(({ checkId }) => checkId));
  return { decidable: true, requirementMet: requirementMet(require, met) };
}
