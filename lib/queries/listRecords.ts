import "server-only";
import { select } from "@/lib/db";
import { ForbiddenError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { iso } from "./findOwn";

type Row = {
  caseId: string;
  sittingNumber: string;
  technician: string;
  code: string;
  checkTitle: string;
  caseNumber: number;
  withinCount: number;
  quantityCount: number;
  met: boolean;
  markedAt: Date;
  questions: number;
};
export type RecordRow = Omit<Row, "markedAt"> & { markedAt: string };

/** Marking records of the employer, newest first, for the people who assess and decide. */
export async function listRecords(actor: Actor): Promise<RecordRow[]> {
  const allowed = actor.roles.some((role) => role === "assessor" || role === "decider" || role === "lead");
  if (!allowed) throw new ForbiddenError("You may not read the firm's marking records.");
  const rows = await select<Row>(SQL, { employerId: actor.employerId });
  return rows.map((row) => ({ ...row, markedAt: iso(row.markedAt) }));
}

const SQL = `
  SELECT x.id AS "caseId", s.number::text AS "sittingNumber", p.name AS technician, m.code,
    (SELECT c ->> 'title' FROM jsonb_array_elements(r.checks) c WHERE c ->> 'id' = x.check_id) AS "checkTitle",
    x.number AS "caseNumber", k.within_count AS "withinCount", jsonb_array_length(k.quantities) AS "quantityCount", k.met,
    k.marked_at AS "markedAt", (SELECT count(*)::int FROM questions q WHERE q.marking_record_id = k.id) AS questions
  FROM case_states x JOIN marking_records k ON k.id = x.record_id JOIN sittings s ON s.id = x.sitting_id
  JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id JOIN people p ON p.id = s.technician_id
  WHERE s.employer_id = :employerId ORDER BY k.marked_at DESC LIMIT 500`;
