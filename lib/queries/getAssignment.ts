import "server-only";
import type { CheckPlan } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import { checkCards, type CheckCardView } from "@/lib/mdx/checkCards";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { isId } from "./findOwn";

type Row = {
  id: string;
  employerId: string;
  technicianId: string;
  technician: string;
  code: string;
  title: string;
  release: string;
  fingerprint: string;
  tree: ModuleTree;
  frontMatter: FrontMatter;
  checks: CheckPlan[];
  dueOn: string;
  feeSettled: boolean;
  sittingId: string | null;
  assignedBy: string;
};
export type AssignmentView = Omit<Row, "employerId" | "technicianId"> & {
  isMine: boolean;
  checkCards: Record<string, CheckCardView>;
};

/** An assignment with the text of its release, for the technician and the people who run sittings. */
export async function getAssignment(actor: Actor, id: string): Promise<AssignmentView | null> {
  if (!isId(id)) return null;
  const [row] = await select<Row>(SQL, { id, employerId: actor.employerId });
  if (!row || !can.readSitting(actor, row)) return null;
  const { employerId: _employer, technicianId, ...view } = row;
  return { ...view, isMine: technicianId === actor.personId, checkCards: checkCards(row.checks) };
}

const SQL = `
  SELECT a.id, a.employer_id AS "employerId", a.technician_id AS "technicianId", p.name AS technician, m.code, r.title,
    r.number AS release, r.fingerprint, r.tree, r.front_matter AS "frontMatter", r.checks, a.due_on::text AS "dueOn",
    f.settled_at IS NOT NULL AS "feeSettled", s.id AS "sittingId", b.name AS "assignedBy"
  FROM assignments a JOIN releases r ON r.id = a.release_id JOIN modules m ON m.id = r.module_id
  JOIN people p ON p.id = a.technician_id JOIN people b ON b.id = a.assigned_by JOIN fees f ON f.assignment_id = a.id
  LEFT JOIN sittings s ON s.assignment_id = a.id
  WHERE a.id = :id AND a.employer_id = :employerId`;
