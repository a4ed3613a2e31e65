import "server-only";
import { CORRECTIONS, markingName, newestCorrections } from "@/lib/checks/corrections";
import { kindOf } from "@/lib/checks/registry";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso } from "./findOwn";
import { reviewedSittings, type ReviewedSitting } from "./reviewedSittings";

type ReviewRow = { id: string; cases: number; computed: number; stopped: number; askedBy: string; askedAt: Date };
export type ReviewView = Omit<ReviewRow, "askedAt"> & {
  askedAt: string;
  /** Those in which a check would be met that was not, or the other way about. */
  changed: ReviewedSitting[];
  /** Sittings that the corrected marking leaves as they are. */
  unchanged: number;
};
export type CorrectionView = {
  marking: string;
  title: string;
  reason: string;
  /** Cases of this employer whose newest record an older marking made. */
  older: number;
  review: ReviewView | null;
};

/** Every corrected marking, with what this employer's review of it has found so far. */
export async function listCorrections(actor: Actor, corrections = CORRECTIONS): Promise<CorrectionView[]> {
  const { employerId } = actor;
  authorize(can.reviewMarkings(actor, { employerId }), "read the corrected markings");
  const views: CorrectionView[] = [];
  for (const { kind, version, revision, reason } of newestCorrections(corrections)) {
    const marking = markingName({ kind, version, revision });
    const [counted] = await select<{ older: number }>(OLDER, { employerId, kind, version, marking });
    const [row] = await select<ReviewRow>(REVIEW, { employerId, marking });
    const title = kindOf(kind, version).title;
    views.push({ marking, title, reason, older: counted!.older, review: row ? await reviewView(row) : null });
  }
  return views;
}

async function reviewView(row: ReviewRow): Promise<ReviewView> {
  const sittings = await reviewedSittings(row.id);
  const changed = sittings.filter(({ cases }) => cases.some(({ met, metBefore }) => met !== metBefore));
  return { ...row, askedAt: iso(row.askedAt), changed, unchanged: sittings.length - changed.length };
}

const OLDER = `
  SELECT count(*)::int AS older FROM case_states x JOIN marking_records k ON k.id = x.record_id JOIN sittings s ON s.id = x.sitting_id
  WHERE s.employer_id = :employerId AND x.kind = :kind AND x.kind_version = :version AND k.marking <> :marking`;
// A finding clears the progress of its job, so a fault that stands is of a case without one.
const REVIEW = `
  SELECT v.id, v.cases, p.name AS "askedBy", v.asked_at AS "askedAt",
    (SELECT count(*)::int FROM review_findings f WHERE f.review_id = v.id) AS computed,
    (SELECT count(*)::int FROM case_states x JOIN sittings s ON s.id = x.sitting_id
       JOIN progress g ON g.subject_id = x.id AND g.job = 'review-case' AND g.fault IS NOT NULL
     WHERE s.employer_id = v.employer_id AND x.kind = v.kind AND x.kind_version = v.kind_version) AS stopped
  FROM marking_reviews v JOIN people p ON p.id = v.asked_by WHERE v.employer_id = :employerId AND v.marking = :marking`;
