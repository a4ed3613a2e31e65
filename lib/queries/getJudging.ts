import "server-only";
import type { Answers, PublicCase } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import { briefOf } from "@/lib/mdx/briefOf";
import type { ModuleTree, TreeElement } from "@/lib/mdx/moduleTree";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso, isId } from "./findOwn";
import { CHECK_ELEMENT } from "./sittingState";

type Row = {
  caseId: string;
  sittingNumber: string;
  employerId: string;
  technicianId: string;
  technician: string;
  code: string;
  moduleTitle: string;
  caseNumber: number;
  state: "handed in" | "marked";
  handedInAt: Date;
  byClock: boolean;
  words: string;
  answers: Answers;
  view: PublicCase;
  check: TreeElement | null;
};
export type JudgingView = Pick<
  Row,
  "caseId" | "sittingNumber" | "technician" | "code" | "moduleTitle" | "caseNumber" | "byClock" | "words"
> & {
  checkTitle: string;
  handedInAt: string;
  isJudged: boolean;
  brief: ModuleTree | null;
  lines: { of: string; label: string; critical: boolean; text: string }[];
};

/** A written hand-in as its assessor reads it: the brief, each line, the words; null for who may not judge it. */
export async function getJudging(actor: Actor, caseId: string): Promise<JudgingView | null> {
  authorize(can.readQueue(actor, actor), "read the queue");
  if (!isId(caseId)) return null;
  const [row] = await select<Row>(SQL, { caseId, employerId: actor.employerId });
  if (!row || !can.judge(actor, row)) return null;
  const { view, answers, check, state, employerId: _employer, technicianId: _technician, ...shown } = row;
  return {
    ...shown,
    checkTitle: view.title,
    handedInAt: iso(row.handedInAt),
    isJudged: state === "marked",
    brief: briefOf(check),
    lines: view.sections.flatMap((section) =>
      section.fields.map((field) => ({
        of: field.quantity,
        label: field.label,
        critical: view.tolerances.some((one) => one.quantity === field.quantity && one.critical),
        text: answers[`${section.id}.${field.id}`] ?? "",
      })),
    ),
  };
}

const SQL = `
  SELECT x.id AS "caseId", s.number::text AS "sittingNumber", s.employer_id AS "employerId", s.technician_id AS "technicianId",
    p.name AS technician, m.code, r.title AS "moduleTitle", x.number AS "caseNumber", x.state, x.handed_in_at AS "handedInAt",
    x.by_clock AS "byClock", h.words, h.answers, v.view, ${CHECK_ELEMENT} AS "check"
  FROM case_states x JOIN sittings s ON s.id = x.sitting_id JOIN releases r ON r.id = s.release_id
  JOIN modules m ON m.id = r.module_id JOIN people p ON p.id = s.technician_id
  JOIN hand_ins h ON h.case_id = x.id JOIN case_views v ON v.case_id = x.id
  WHERE x.id = :caseId AND s.employer_id = :employerId AND x.kind = 'written'`;
