import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { requirementMet, type Requirement } from "@/lib/policies/requirement";
import { iso } from "./findOwn";

type Row = {
  number: string;
  sittingNumber: string;
  technician: string;
  code: string;
  title: string;
  require: Requirement;
  metChecks: string[];
  markedAt: Date;
};
export type CertificateReviewRow = Omit<Row, "require" | "metChecks" | "markedAt"> & { markedAt: string };

/**
 * Valid certificates whose sitting no longer meets the requirement of its release, since a record of it was made again.
 * They wait until the decider sets a standing: suspended, withdrawn, or reinstated after that.
 */
export async function listCertificateReviews(actor: Actor): Promise<CertificateReviewRow[]> {
  authorize(can.readQueue(actor, actor), "read the queue");
  const rows = await select<Row>(SQL, { employerId: actor.employerId });
  return rows
    .filter(({ require, metChecks }) => !requirementMet(require, new Set(metChecks)))
    .map(({ require: _require, metChecks: _met, ...row }) => ({ ...row, markedAt: iso(row.markedAt) }));
}

const SQL = `
  SELECT c.number, s.number::text AS "sittingNumber", p.name AS technician, m.code, r.title, r.front_matter -> 'require' AS require,
    coalesce((SELECT json_agg(DISTINCT x.check_id) FROM case_states x WHERE x.sitting_id = s.id AND x.met), '[]') AS "metChecks",
    again.at AS "markedAt"
  FROM certificates c JOIN certificate_standings z ON z.certificate_id = c.id JOIN decisions d ON d.id = c.decision_id
  JOIN sittings s ON s.id = c.sitting_id JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id
  JOIN people p ON p.id = c.holder_id
  CROSS JOIN LATERAL (SELECT max(k.marked_at) AS at FROM marking_records k JOIN cases x ON x.id = k.case_id
    WHERE x.sitting_id = s.id AND k.sequence > 1 AND k.marked_at > d.decided_at) again
  WHERE c.employer_id = :employerId AND z.standing = 'valid' AND again.at IS NOT NULL
    AND (z.sequence = 1 OR z.set_at < again.at)
  ORDER BY again.at, c.number`;
