import "server-only";
import type { Marking } from "@/lib/checks/kind";
import type { CheckPlan } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { iso, isId, isoOrNull } from "./findOwn";
import type { SittingState } from "./sittingState";
import { SITTING_STATE } from "./sittingState";

type Row = {
  id: string;
  caseId: string;
  caseNumber: number;
  freshCases: number;
  checkId: string;
  sittingId: string;
  sittingNumber: string;
  sittingState: SittingState;
  employerId: string;
  technicianId: string;
  technician: string;
  code: string;
  moduleTitle: string;
  release: string;
  fingerprint: string;
  checks: CheckPlan[];
  marking: string;
  engineVersion: string;
  rows: Marking["rows"];
  quantities: Marking["quantities"];
  withinCount: number;
  needs: number;
  met: boolean;
  workings: Marking["workings"];
  durationMs: number;
  markedAt: Date;
  sequence: number;
  reason: string;
  words: string;
  byClock: boolean;
  /** Name of the assessor, where no machine marked. */
  judge: string | null;
  handedInAt: Date;
  captureSha256: string | null;
};
export type RecordLine = { sequence: number; marking: string; met: boolean; markedAt: string };
type Asked = {
  id: string;
  quantity: string;
  words: string;
  askedAt: Date;
  answer: string | null;
  answeredBy: string | null;
  answeredAt: Date | null;
};

export type MarkingRecordView = Omit<Row, "employerId" | "technicianId" | "markedAt" | "handedInAt" | "checks"> & {
  checkTitle: string;
  markedAt: string;
  handedInAt: string;
  isMine: boolean;
  /** All records of the case, the newest first; an earlier one is followed, never changed. */
  records: RecordLine[];
  mayAnswer: boolean;
  questions: (Omit<Asked, "askedAt" | "answeredAt"> & { askedAt: string; answeredAt: string | null })[];
};

/**
 * A marking record of a case: whole, with reasons and workings. Null until it is marked.
 * @param sequence an earlier one; the newest when left out
 */
export async function getMarkingRecord(
  actor: Actor,
  caseId: string,
  sequence: number | null = null,
): Promise<MarkingRecordView | null> {
  if (!isId(caseId)) return null;
  const [row] = await select<Row>(SQL, { caseId, sequence, employerId: actor.employerId });
  if (!row || !can.readRecord(actor, row)) return null;
  const { employerId: _employer, technicianId, checks, ...view } = row;
  const questions = await select<Asked>(QUESTIONS, { caseId });
  const records = await select<Omit<RecordLine, "markedAt"> & { markedAt: Date }>(RECORDS, { caseId });
  return {
    ...view,
    checkTitle: checks.find((plan) => plan.id === row.checkId)!.title,
    markedAt: iso(row.markedAt),
    handedInAt: iso(row.handedInAt),
    records: records.map((one) => ({ ...one, markedAt: iso(one.markedAt) })),
    mayAnswer: can.answerQuestion(actor, row),
    isMine: technicianId === actor.personId,
    questions: questions.map((one) => ({ ...one, askedAt: iso(one.askedAt), answeredAt: isoOrNull(one.answeredAt) })),
  };
}

const SQL = `
  SELECT k.id, k.case_id AS "caseId", x.number AS "caseNumber", (r.front_matter #>> '{sitting,freshCases}')::int AS "freshCases",
    x.check_id AS "checkId", s.id AS "sittingId", s.number::text AS "sittingNumber", ${SITTING_STATE} AS "sittingState",
    s.employer_id AS "employerId", s.technician_id AS "technicianId", p.name AS technician, m.code, r.title AS "moduleTitle",
    r.number AS release, r.fingerprint, r.checks, k.marking, k.engine_version AS "engineVersion", k.rows, k.quantities,
    k.within_count AS "withinCount", k.needs, k.met, k.workings, k.duration_ms AS "durationMs", k.marked_at AS "markedAt",
    k.sequence, k.reason, jp.name AS judge, h.words, h.by_clock AS "byClock", h.handed_in_at AS "handedInAt",
    (SELECT sha256 FROM captures WHERE case_id = x.id AND name LIKE '%-data') AS "captureSha256"
  FROM case_states x JOIN marking_records k ON k.case_id = x.id
    AND CASE WHEN :sequence::int IS NULL THEN k.id = x.record_id ELSE k.sequence = :sequence::int END
  JOIN hand_ins h ON h.case_id = x.id
  JOIN sittings s ON s.id = x.sitting_id JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id
  LEFT JOIN people jp ON jp.id = k.judged_by
  JOIN people p ON p.id = s.technician_id JOIN fees f ON f.assignment_id = s.assignment_id
  LEFT JOIN decisions d ON d.sitting_id = s.id LEFT JOIN certificates c ON c.sitting_id = s.id
  WHERE x.id = :caseId AND s.employer_id = :employerId`;
const RECORDS = `
  SELECT sequence, marking, met, marked_at AS "markedAt" FROM marking_records WHERE case_id = :caseId ORDER BY sequence DESC`;
const QUESTIONS = `
  SELECT q.id, q.quantity, q.words, q.asked_at AS "askedAt", a.words AS answer, ap.name AS "answeredBy", a.answered_at AS "answeredAt"
  FROM questions q LEFT JOIN question_answers a ON a.question_id = q.id LEFT JOIN people ap ON ap.id = a.answered_by
  JOIN marking_records k ON k.id = q.marking_record_id WHERE k.case_id = :caseId ORDER BY q.asked_at`;
