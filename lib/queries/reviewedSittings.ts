import "server-only";
import type { ChangedRow } from "@/lib/checks/changedRows";
import { select } from "@/lib/db";
import type { Requirement } from "@/lib/policies/requirement";
import { reviewedOutcome } from "@/lib/policies/reviewedOutcome";
import type { StandingWord } from "@/lib/policies/standing";
import type { ReviewActWord } from "@/models/ReviewAct";
import { isoOrNull } from "./findOwn";

type CaseOfReview = {
  caseId: string;
  checkId: string;
  checkTitle: string;
  number: number;
  metBefore: boolean;
  met: boolean;
  changedRows: ChangedRow[];
};
type Row = {
  sittingId: string;
  number: string;
  technician: string;
  code: string;
  title: string;
  require: Requirement;
  outcome: "competent" | "not yet competent" | null;
  certificate: string | null;
  standing: StandingWord | null;
  cases: CaseOfReview[];
  act: ReviewActWord | null;
  /** The records that the act asked for are there. */
  isMarkedAgain: boolean;
  actReason: string | null;
  actedBy: string | null;
  actedAt: Date | null;
};
export type ReviewedSitting = Omit<Row, "require" | "actedAt"> & {
  actedAt: string | null;
  /** The release's requirement by the records as they were, and by the corrected marking. */
  requirement: { before: boolean; now: boolean };
};

/** The sittings of a review, each with all its marked cases: those the review has computed, and the others as they stand. */
export async function reviewedSittings(reviewId: string): Promise<ReviewedSitting[]> {
  const rows = await select<Row>(SQL, { reviewId });
  return rows.map(({ require, actedAt, ...row }) => ({
    ...row,
    actedAt: isoOrNull(actedAt),
    requirement: reviewedOutcome(require, row.cases),
  }));
}

const CASES = `
  SELECT json_agg(json_build_object('caseId', x.id, 'checkId', x.check_id, 'number', x.number,
    'checkTitle', (SELECT c ->> 'title' FROM jsonb_array_elements(r.checks) c WHERE c ->> 'id' = x.check_id),
    'metBefore', coalesce(f.met_before, x.met), 'met', coalesce(f.met, x.met), 'changedRows', coalesce(f.changed_rows, '[]'))
    ORDER BY x.check_id, x.number)
  FROM case_states x LEFT JOIN review_findings f ON f.case_id = x.id AND f.review_id = :reviewId
  WHERE x.sitting_id = s.id AND x.state = 'marked'`;
const SQL = `
  SELECT s.id AS "sittingId", s.number::text AS number, p.name AS technician, m.code, r.title, r.front_matter -> 'require' AS require,
    d.outcome, c.number AS certificate, z.standing, (${CASES}) AS cases, a.act, a.reason AS "actReason", ap.name AS "actedBy",
    a.acted_at AS "actedAt", EXISTS (SELECT 1 FROM marking_records k JOIN cases x ON x.id = k.case_id
      JOIN marking_reviews v ON v.id = :reviewId
      WHERE x.sitting_id = s.id AND k.sequence > 1 AND k.marking = v.marking) AS "isMarkedAgain"
  FROM sittings s JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id JOIN people p ON p.id = s.technician_id
  LEFT JOIN decisions d ON d.sitting_id = s.id LEFT JOIN certificates c ON c.sitting_id = s.id
  LEFT JOIN certificate_standings z ON z.certificate_id = c.id
  LEFT JOIN review_acts a ON a.sitting_id = s.id AND a.review_id = :reviewId LEFT JOIN people ap ON ap.id = a.acted_by
  WHERE s.id IN (SELECT x.sitting_id FROM review_findings f JOIN cases x ON x.id = f.case_id WHERE f.review_id = :reviewId)
  ORDER BY s.number`;
