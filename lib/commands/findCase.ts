import "server-only";
import type { CheckPlan } from "@/lib/checks/kind";
import { Case, Employer, Release, Sitting } from "@/models";

export type FoundCase = { found: Case; sitting: Sitting; release: Release; employer: Employer; plan: CheckPlan };

/** A case with all that it hangs on. None of it ever changes, so it needs no lock. For jobs: nobody's rights are asked. */
export async function findCase(caseId: string): Promise<FoundCase> {
  const found = await Case.findByPk(caseId, { rejectOnEmpty: true });
  const sitting = await Sitting.findByPk(found.sittingId, { rejectOnEmpty: true });
  const attributes = { exclude: ["source", "tree"] };
  const release = await Release.findByPk(sitting.releaseId, { attributes, rejectOnEmpty: true });
  const employer = await Employer.findByPk(sitting.employerId, { rejectOnEmpty: true });
  const plan = release.checks.find((check) => check.id === found.checkId);
  if (!plan) throw new Error(`findCase: release ${release.id} has no check ${found.checkId}`);
  return { found, sitting, release, employer, plan };
}
