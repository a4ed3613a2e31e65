import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso } from "./findOwn";

type Row = {
  id: string;
  caseId: string;
  sittingNumber: string;
  technician: string;
  code: string;
  checkTitle: string;
  quantity: string;
  words: string;
  askedAt: Date;
};
export type QuestionRow = Omit<Row, "askedAt"> & { askedAt: string };

/** Questioned quantities that nobody has answered, the one that waits longest first. */
export async function listQuestions(actor: Actor): Promise<QuestionRow[]> {
  authorize(can.readQueue(actor, actor), "read the queue");
  const rows = await select<Row>(SQL, { employerId: actor.employerId });
  return rows.map((row) => ({ ...row, askedAt: iso(row.askedAt) }));
}

const SQL = `
  SELECT q.id, k.case_id AS "caseId", s.number::text AS "sittingNumber", p.name AS technician, m.code, q.words,
    q.asked_at AS "askedAt",
    (SELECT c ->> 'title' FROM jsonb_array_elements(r.checks) c WHERE c ->> 'id' = x.check_id) AS "checkTitle",
    coalesce((SELECT n ->> 'label' FROM jsonb_array_elements(k.quantities) n WHERE n ->> 'of' = q.quantity), q.quantity) AS quantity
  FROM questions q JOIN marking_records k ON k.id = q.marking_record_id JOIN cases x ON x.id = k.case_id
  JOIN sittings s ON s.id = x.sitting_id JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id
  JOIN people p ON p.id = q.asked_by
  WHERE s.employer_id = :employerId AND NOT EXISTS (SELECT 1 FROM question_answers a WHERE a.question_id = q.id)
  ORDER BY q.asked_at LIMIT 200`;
