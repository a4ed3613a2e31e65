import "server-only";
import type { CertifiedQuantity } from "@/lib/certificates/record";
import type { PublicCase } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import { Decision, Employer, Fee, Person, Release, Sitting } from "@/models";

export type FoundDecision = {
  decision: Decision;
  sitting: Sitting;
  release: Release;
  employer: Employer;
  decider: Person;
  holder: Person;
  /** Of the checks that were met, with the tolerances they were marked with. */
  quantities: CertifiedQuantity[];
};

/**
 * A decision of competent with all that its certificate says. For jobs: nobody's rights are asked.
 * @throws Error when it is no such decision or the fee is open, so that the job waits and is tried again
 */
export async function findDecision(decisionId: string): Promise<FoundDecision> {
  const decision = await Decision.findByPk(decisionId, { rejectOnEmpty: true });
  if (decision.outcome !== "competent") throw new Error(`findDecision: ${decisionId} is ${decision.outcome}`);
  const sitting = await Sitting.findByPk(decision.sittingId, { rejectOnEmpty: true });
  const fee = await Fee.findOne({ where: { assignmentId: sitting.assignmentId } });
  if (!fee?.settledAt) throw new Error(`findDecision: the fee of sitting ${sitting.id} is open`);
  const attributes = { exclude: ["source", "tree"] };
  const release = await Release.findByPk(sitting.releaseId, { attributes, rejectOnEmpty: true });
  const employer = await Employer.findByPk(sitting.employerId, { rejectOnEmpty: true });
  const decider = await Person.findByPk(decision.decidedBy, { rejectOnEmpty: true });
  const holder = await Person.findByPk(sitting.technicianId, { rejectOnEmpty: true });
  return { decision, sitting, release, employer, decider, holder, quantities: await certified(sitting, release) };
}

// In the release's order. A check that the release does not require may have stayed unmet: it is not certified.
async function certified(sitting: Sitting, release: Release): Promise<CertifiedQuantity[]> {
  const rows = await select<{ checkId: string; view: PublicCase }>(MET_CASES, { sittingId: sitting.id });
  const views = new Map(rows.map(({ checkId, view }) => [checkId, view]));
  return release.checks.flatMap(({ id, title }) =>
    (views.get(id)?.tolerances ?? []).map(({ label, tolerance, critical }) => {
      return { check: id, title, label, tolerance, critical };
    }),
  );
}

const MET_CASES = `
  SELECT x.check_id AS "checkId", v.view FROM case_states x JOIN case_views v ON v.case_id = x.id
  WHERE x.sitting_id = :sittingId AND x.met ORDER BY x.number`;
