import "server-only";
import type { Transaction } from "sequelize";
import type { CheckPlan } from "@/lib/checks/kind";
import { Case, Employer, Release, Sitting } from "@/models";

export type FoundCase = { found: Case; sitting: Sitting; release: Release; employer: Employer; plan: CheckPlan };

/** A case with all that it hangs on. None of it ever changes, so it needs no lock. For jobs: nobody's rights are asked. */
export async function findCase(caseId: string, transaction?: Transaction): Promise<FoundCase> {
  const found = await Case.findByPk(caseId, { transaction, rejectOnEmpty: true });
  const sitting = await Sitting.findByPk(found.sittingId, { transaction, rejectOnEmpty: true });
  const attributes = { exclude: ["source", "tree"] };
  const release = await Release.findByPk(sitting.releaseId, { attributes, transaction, rejectOnEmpty: true });
  const employer = await Employer.findByPk(sitting.employerId, { transaction, rejectOnEmpty: true });
  const plan = release.checks.find((check) => check.id === found.checkId);
  if (!plan) throw new Error(`findCase: release ${release.id} has no check ${found.checkId}`);
  return { found, sitting, release, employer, plan };
}
