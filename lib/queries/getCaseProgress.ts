import "server-only";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { isId } from "./findOwn";

type Row = {
  employerId: string;
  technicianId: string;
  state: "building" | "open" | "handed in" | "marked";
  step: string | null;
  done: number | null;
  total: number | null;
  fault: string | null;
};
export type CaseProgress = {
  state: Row["state"];
  /** What the worker is at; null while the job waits for its turn. */
  step: string | null;
  done: number;
  total: number;
  /** A reference to give to the operator; the job will not go on by itself. */
  fault: string | null;
};

/** How far building or marking has come, for the person who waits. */
export async function getCaseProgress(actor: Actor, caseId: string): Promise<CaseProgress | null> {
  if (!isId(caseId)) return null;
  const [row] = await select<Row>(SQL, { caseId, employerId: actor.employerId });
  if (!row || !can.readRecord(actor, row)) return null;
  return { state: row.state, step: row.step, done: row.done ?? 0, total: row.total ?? 0, fault: row.fault };
}

const SQL = `
  SELECT s.employer_id AS "employerId", s.technician_id AS "technicianId", x.state, p.step, p.done, p.total, p.fault
  FROM case_states x JOIN sittings s ON s.id = x.sitting_id
  LEFT JOIN progress p ON p.subject_id = x.id
    AND p.job = CASE x.state WHEN 'building' THEN 'build-case' ELSE 'mark-case' END
  WHERE x.id = :caseId AND s.employer_id = :employerId`;
