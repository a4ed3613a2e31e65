import "server-only";
import { dayIn } from "@/lib/calendar";
import type { Marking } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { decidability, type Decidability } from "@/lib/policies/decidability";
import { barsToDeciding } from "@/lib/policies/separation";
import { Assignment, Employer, Sitting } from "@/models";
import { iso, isId } from "./findOwn";
import { getSitting, type SittingView } from "./getSitting";
import { releasedOutside, type ReleasedOutside } from "./releasedOutside";
import { separationFacts } from "./separationFacts";

type RecordRow = {
  caseId: string;
  checkId: string;
  caseNumber: number;
  rows: Marking["rows"];
  quantities: Marking["quantities"];
  withinCount: number;
  needs: number;
  met: boolean;
  words: string;
  handedInAt: Date;
  openedAt: Date;
  endsAt: Date;
  byClock: boolean;
};
type QuestionRow = { caseId: string; quantity: string; words: string; askedAt: Date; answer: string | null };

export type DecisionDeskView = {
  sitting: SittingView;
  /** Why the server would refuse this person; empty when it would not. */
  bars: string[];
  decidability: Decidability;
  outsideLine: boolean;
  /** Why the lead assigned it although this person had opened as many cases of a kind as may be. */
  exposureNote: string | null;
  mayDecide: boolean;
  /** A record was made after the decision, which stands on the earlier one. */
  isMarkedAgain: boolean;
  records: (Omit<RecordRow, "handedInAt" | "openedAt" | "endsAt"> & {
    handedInAt: string;
    openedAt: string;
    endsAt: string;
  })[];
  questions: (Omit<QuestionRow, "askedAt"> & { askedAt: string })[];
  /** Released outside a bound of the release check, with the reason given. */
  releasedOutside: ReleasedOutside[];
};

/** All that lies before the decider, in the order a decider asks for it. */
export async function getDecisionDesk(
  actor: Actor,
  sittingId: string,
  now = new Date(),
): Promise<DecisionDeskView | null> {
  authorize(can.readQueue(actor, actor), "read the queue");
  const sitting = isId(sittingId) ? await getSitting(actor, sittingId, now) : null;
  if (!sitting) return null;
  const row = await Sitting.findByPk(sittingId, { rejectOnEmpty: true });
  const employer = await Employer.findByPk(actor.employerId, { rejectOnEmpty: true });
  const assignment = await Assignment.findByPk(row.assignmentId, { rejectOnEmpty: true });
  const today = dayIn(employer.timeZone, now);
  const records = await select<RecordRow>(RECORDS, { sittingId });
  const questions = await select<QuestionRow>(QUESTIONS, { sittingId });
  const cases = sitting.checks.flatMap(({ plan, cases: lines }) =>
    lines.map(({ state, met }) => ({ checkId: plan.id, state, met })),
  );
  const checks = sitting.checks.map(({ plan }) => plan);
  return {
    sitting,
    bars: barsToDeciding(await separationFacts(actor, row, today)),
    decidability: decidability(checks, sitting.frontMatter.require, cases, today > sitting.lastDay),
    outsideLine: actor.outsideLine,
    exposureNote: assignment.exposureNote,
    mayDecide: can.decide(actor, actor),
    isMarkedAgain: (await select(MARKED_SINCE, { sittingId })).length > 0,
    records: records.map((record) => ({
      ...record,
      handedInAt: iso(record.handedInAt),
      openedAt: iso(record.openedAt),
      endsAt: iso(record.endsAt),
    })),
    questions: questions.map((question) => ({ ...question, askedAt: iso(question.askedAt) })),
    releasedOutside: await releasedOutside(row.releaseId),
  };
}

const RECORDS = `
  SELECT x.id AS "caseId", x.check_id AS "checkId", x.number AS "caseNumber", k.rows, k.quantities, k.within_count AS "withinCount",
    k.needs, k.met, h.words, x.handed_in_at AS "handedInAt", x.opened_at AS "openedAt", x.ends_at AS "endsAt", x.by_clock AS "byClock"
  FROM case_states x JOIN marking_records k ON k.id = x.record_id JOIN hand_ins h ON h.case_id = x.id
  WHERE x.sitting_id = :sittingId ORDER BY x.handed_in_at`;
const MARKED_SINCE = `
  SELECT 1 FROM case_states x JOIN decisions d ON d.sitting_id = x.sitting_id
  WHERE x.sitting_id = :sittingId AND x.marked_at > d.decided_at LIMIT 1`;
const QUESTIONS = `
  SELECT x.id AS "caseId", q.quantity, q.words, q.asked_at AS "askedAt", a.words AS answer
  FROM questions q LEFT JOIN question_answers a ON a.question_id = q.id
  JOIN marking_records k ON k.id = q.marking_record_id JOIN cases x ON x.id = k.case_id
  WHERE x.sitting_id = :sittingId ORDER BY q.asked_at`;
