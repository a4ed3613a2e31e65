import "server-only";
import { select } from "@/lib/db";
import { ConflictError, InvalidError, NotFoundError } from "@/lib/errors";
import { enqueue } from "@/lib/jobs/enqueue";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { MarkingReview, ReviewAct } from "@/models";
import type { ReviewActWord } from "@/models/ReviewAct";
import { lockOwnSitting, requireId } from "./lockOwn";
import { transact } from "./transact";

type Act = { reviewId: string; sittingId: string; act: ReviewActWord; reason: string };

/**
 * A sitting of which a corrected marking says something else is marked again, by a job, or left as it is with a reason.
 * One act a sitting; the same one pressed twice is once.
 */
export const actOnReview = (actor: Actor, { reviewId, sittingId, act, reason }: Act, now = new Date()) =>
  transact(actor, async (transaction) => {
    requireId(reviewId, "review");
    const where = { id: reviewId, employerId: actor.employerId };
    const review = await MarkingReview.findOne({ where, transaction });
    if (!review) throw new NotFoundError("review");
    authorize(can.reviewMarkings(actor, review), "act on this review");
    await lockOwnSitting(actor, sittingId, transaction);
    const earlier = await ReviewAct.findOne({ where: { reviewId, sittingId }, transaction });
    if (earlier && earlier.act === act) return { id: earlier.id };
    if (earlier) throw new ConflictError("This sitting has been acted on already.");
    const { marking } = review;
    const [cases] = await select<{ found: number; open: number }>(CASES, { reviewId, sittingId, marking }, transaction);
    if (cases!.open > 0) throw new ConflictError("A case of this sitting is still being computed.");
    if (cases!.found === 0) throw new NotFoundError("sitting in this review");
    if (act === "leave" && reason.trim() === "")
      throw new InvalidError("Say why it is left.", { reason: ["Say why it is left."] });
    const { id } = await ReviewAct.create(
      { reviewId, sittingId, act, reason: reason.trim(), actedBy: actor.personId, actedAt: now },
      { transaction },
    );
    if (act === "mark again") await enqueue("mark-again", { actId: id }, transaction);
    return { id };
  });

const CASES = `
  SELECT count(f.id)::int AS found, count(*) FILTER (WHERE f.id IS NULL AND k.marking <> :marking)::int AS open
  FROM marking_reviews v JOIN case_states x ON x.sitting_id = :sittingId AND x.kind = v.kind AND x.kind_version = v.kind_version
  JOIN marking_records k ON k.id = x.record_id
  LEFT JOIN review_findings f ON f.case_id = x.id AND f.review_id = v.id WHERE v.id = :reviewId`;
