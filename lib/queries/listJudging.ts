import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso } from "./findOwn";

type Row = {
  caseId: string;
  sittingNumber: string;
  employerId: string;
  technicianId: string;
  technician: string;
  code: string;
  checkTitle: string;
  caseNumber: number;
  handedInAt: Date;
};
export type JudgingRow = Omit<Row, "employerId" | "technicianId" | "handedInAt"> & { handedInAt: string };

/** Written hand-ins that wait for this assessor or another, the one that waits longest first. */
export async function listJudging(actor: Actor): Promise<JudgingRow[]> {
  authorize(can.readQueue(actor, actor), "read the queue");
  const rows = await select<Row>(SQL, { employerId: actor.employerId });
  return rows
    .filter((row) => can.judge(actor, row))
    .map(({ employerId: _employer, technicianId: _technician, ...row }) => ({
      ...row,
      handedInAt: iso(row.handedInAt),
    }));
}

const SQL = `
  SELECT x.id AS "caseId", s.number::text AS "sittingNumber", s.employer_id AS "employerId", s.technician_id AS "technicianId",
    p.name AS technician, m.code, x.number AS "caseNumber", x.handed_in_at AS "handedInAt",
    (SELECT c ->> 'title' FROM jsonb_array_elements(r.checks) c WHERE c ->> 'id' = x.check_id) AS "checkTitle"
  FROM case_states x JOIN sittings s ON s.id = x.sitting_id JOIN releases r ON r.id = s.release_id
  JOIN modules m ON m.id = r.module_id JOIN people p ON p.id = s.technician_id
  WHERE s.employer_id = :employerId AND x.kind = 'written' AND x.state = 'handed in' ORDER BY x.handed_in_at`;
