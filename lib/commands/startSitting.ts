import "server-only";
import { addDays, dayIn } from "@/lib/calendar";
import { ConflictError, NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Assignment, Employer, Fee, Release, Sitting } from "@/models";
import { requireId } from "./lockOwn";
import { transact } from "./transact";

/** Version of the conditions shown before a sitting starts; the sitting keeps which one was accepted. */
export const SITTING_TERMS = "2026-12";

/** Start the sitting of an assignment. Starting twice gives the same sitting. */
export const startSitting = (actor: Actor, assignmentId: string, now = new Date()) =>
  transact(actor, async (transaction) => {
    requireId(assignmentId, "assignment");
    const where = { id: assignmentId, employerId: actor.employerId };
    const assignment = await Assignment.findOne({ where, transaction });
    if (!assignment) throw new NotFoundError("assignment");
    authorize(can.sit(actor, assignment), "start this sitting");
    // Locked, so that a second press of the same key waits and finds the sitting of the first one.
    const fee = await Fee.findOne({ where: { assignmentId }, transaction, lock: transaction.LOCK.UPDATE });
    const started = await Sitting.findOne({ where: { assignmentId }, transaction });
    if (started) return { id: started.id };
    if (!fee?.settledAt) throw new ConflictError("The fee of this sitting is open. It opens once the fee is settled.");
    const release = await Release.findByPk(assignment.releaseId, { transaction, rejectOnEmpty: true });
    const employer = await Employer.findByPk(actor.employerId, { transaction, rejectOnEmpty: true });
    const sitting = await Sitting.create(
      {
        assignmentId,
        releaseId: release.id,
        technicianId: actor.personId,
        employerId: actor.employerId,
        terms: SITTING_TERMS,
        startedAt: now,
        lastDay: addDays(dayIn(employer.timeZone, now), release.frontMatter.sitting.days - 1),
      },
      { transaction },
    );
    return { id: sitting.id };
  });
