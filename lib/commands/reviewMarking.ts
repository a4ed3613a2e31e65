import "server-only";
import { CORRECTIONS, markingName, newestCorrections } from "@/lib/checks/corrections";
import { select } from "@/lib/db";
import { ConflictError, NotFoundError } from "@/lib/errors";
import { enqueue } from "@/lib/jobs/enqueue";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { MarkingReview } from "@/models";
import { transact } from "./transact";

/**
 * Hold a corrected marking against every record of this employer that an older one made. The worker computes; no record
 * changes. Pressed twice it is one review.
 */
export const reviewMarking = (actor: Actor, marking: string, now = new Date(), corrections = CORRECTIONS) =>
  transact(actor, async (transaction) => {
    const { employerId, personId } = actor;
    authorize(can.reviewMarkings(actor, { employerId }), "review a corrected marking");
    const correction = newestCorrections(corrections).find((one) => markingName(one) === marking);
    if (!correction) throw new NotFoundError("corrected marking");
    const { kind, version, reason } = correction;
    const older = await select<{ id: string }>(OLDER, { employerId, kind, version, marking }, transaction);
    if (older.length === 0) throw new ConflictError("Your firm has no record of an older marking.");
    const row = { employerId, kind, version, marking, reason, cases: older.length, personId, now };
    // Of two presses at once the second waits for the first one's row, and then adds nothing.
    const [added] = await select<{ id: string }>(ADD, row, transaction);
    if (!added) {
      const { id } = await MarkingReview.findOne({ where: { employerId, marking }, transaction, rejectOnEmpty: true });
      return { id };
    }
    for (const { id: caseId } of older) await enqueue("review-case", { reviewId: added.id, caseId }, transaction);
    return { id: added.id };
  });

const OLDER = `
  SELECT x.id FROM case_states x JOIN marking_records k ON k.id = x.record_id JOIN sittings s ON s.id = x.sitting_id
  WHERE s.employer_id = :employerId AND x.kind = :kind AND x.kind_version = :version AND k.marking <> :marking`;
const ADD = `
  INSERT INTO marking_reviews (employer_id, kind, kind_version, marking, reason, cases, asked_by, asked_at)
  VALUES (:employerId, :kind, :version, :marking, :reason, :cases, :personId, :now)
  ON CONFLICT (employer_id, marking) DO NOTHING RETURNING id`;
