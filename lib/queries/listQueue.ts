import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { isoOrNull } from "./findOwn";
import { SITTING_STATE } from "./sittingState";

type Row = {
  sittingId: string;
  number: string;
  technician: string;
  code: string;
  title: string;
  checks: number;
  met: number;
  readyAt: Date | null;
  questions: number;
};
export type QueueRow = Omit<Row, "readyAt"> & { readyAt: string | null };

/** Sittings that wait for a decision, the one that waits longest first. */
export async function listQueue(actor: Actor): Promise<QueueRow[]> {
  authorize(can.readQueue(actor, actor), "read the queue");
  const rows = await select<Row>(SQL, { employerId: actor.employerId });
  return rows.map((row) => ({ ...row, readyAt: isoOrNull(row.readyAt) }));
}

const SQL = `
  SELECT "sittingId", number, technician, code, title, checks, met, "readyAt", questions FROM (
    SELECT s.id AS "sittingId", s.number::text AS number, p.name AS technician, m.code, r.title,
      jsonb_array_length(r.checks) AS checks, ${SITTING_STATE} AS state,
      (SELECT count(DISTINCT x.check_id)::int FROM case_states x WHERE x.sitting_id = s.id AND x.met) AS met,
      (SELECT max(x.marked_at) FROM case_states x WHERE x.sitting_id = s.id) AS "readyAt",
      (SELECT count(*)::int FROM questions q JOIN marking_records k ON k.id = q.marking_record_id
         JOIN cases x ON x.id = k.case_id WHERE x.sitting_id = s.id) AS questions
    FROM sittings s JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id
    JOIN people p ON p.id = s.technician_id JOIN fees f ON f.assignment_id = s.assignment_id
    LEFT JOIN decisions d ON d.sitting_id = s.id LEFT JOIN certificates c ON c.sitting_id = s.id
    WHERE s.employer_id = :employerId
  ) waiting WHERE state = 'for decision' ORDER BY "readyAt" NULLS FIRST`;
