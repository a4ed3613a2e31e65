import "server-only";
import type { Transaction } from "sequelize";
import { dayIn } from "@/lib/calendar";
import type { CheckPlan } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import { ConflictError, NotFoundError } from "@/lib/errors";
import { enqueue } from "@/lib/jobs/enqueue";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { exposedUntil, exposureReason } from "@/lib/policies/exposure";
import { nextCaseOf, type EarlierCase } from "@/lib/policies/nextCase";
import { openedCases } from "@/lib/queries/openedCases";
import { Assignment, Case, Decision, Employer, Fee, Release, type Sitting } from "@/models";
import { lockOwnSitting } from "./lockOwn";
import { transact } from "./transact";

/** Ask for the data of one check. The worker draws it; the clock starts when it is there. */
export const openCase = (
  actor: Actor,
  { sittingId, checkId }: { sittingId: string; checkId: string },
  now = new Date(),
) =>
  transact(actor, async (transaction) => {
    const sitting = await lockOwnSitting(actor, sittingId, transaction);
    authorize(can.sit(actor, sitting), "open a case of this sitting");
    const today = await refuseUnlessOpen(sitting, now, transaction);
    const release = await Release.findByPk(sitting.releaseId, { transaction, rejectOnEmpty: true });
    const plan = release.checks.find((check) => check.id === checkId);
    if (!plan) throw new NotFoundError("check");
    const earlier = await select<EarlierCase>(EARLIER_CASES, { sittingId, checkId }, transaction);
    const exposed = await exposedReason(sitting, release, plan, { now, today }, transaction);
    const next = nextCaseOf(earlier, release.frontMatter.sitting, now, exposed);
    // A second press of the same key finds the case that the first one asked for.
    if (next.state === "open") return { id: next.caseId };
    if (next.state === "closed") throw new ConflictError(next.reason);
    const opened = await Case.create(
      { sittingId, checkId, kind: plan.kind, kindVersion: plan.version, number: next.number, requestedAt: now },
      { transaction },
    );
    await enqueue("build-case", { caseId: opened.id }, transaction);
    return { id: opened.id };
  });

async function refuseUnlessOpen(sitting: Sitting, now: Date, transaction: Transaction): Promise<string> {
  const fee = await Fee.findOne({ where: { assignmentId: sitting.assignmentId }, transaction });
  if (!fee?.settledAt)
    throw new ConflictError("The fee of this sitting is open. No case is drawn before it is settled.");
  if (await Decision.count({ where: { sittingId: sitting.id }, transaction })) {
    throw new ConflictError("This sitting is decided. No case can be opened in it.");
  }
  const employer = await Employer.findByPk(sitting.employerId, { transaction, rejectOnEmpty: true });
  const today = dayIn(employer.timeZone, now);
  if (today > sitting.lastDay) throw new ConflictError(`The last day of this sitting was ${sitting.lastDay}.`);
  return today;
}

async function exposedReason(
  sitting: Sitting,
  { moduleId, frontMatter }: Release,
  { id, kind }: CheckPlan,
  { now, today }: { now: Date; today: string },
  transaction: Transaction,
): Promise<string | null> {
  const assignment = await Assignment.findByPk(sitting.assignmentId, { transaction, rejectOnEmpty: true });
  if (assignment.exposureNote !== null) return null;
  const opened = await openedCases(sitting, now, transaction);
  const from = exposedUntil({ id, kind, moduleId }, opened, frontMatter.sitting, today);
  return from && exposureReason(frontMatter.sitting, from);
}

const EARLIER_CASES = `
  SELECT id, number, state, met, handed_in_at AS "handedInAt" FROM case_states
  WHERE sitting_id = :sittingId AND check_id = :checkId ORDER BY number`;
