import "server-only";
import type { CheckPlan } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import { checkCards, type CheckCardView } from "@/lib/mdx/checkCards";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { iso, isId } from "./findOwn";
import { releasedOutside, type ReleasedOutside } from "./releasedOutside";
import { SITTING_STATE, type SittingState } from "./sittingState";

type Row = {
  id: string;
  moduleId: string;
  code: string;
  number: string;
  kind: string;
  title: string;
  tree: ModuleTree;
  frontMatter: FrontMatter;
  checks: CheckPlan[];
  fingerprint: string;
  reason: string;
  releasedBy: string;
  releasedAt: Date;
};

export type AssignedLine = {
  id: string;
  technician: string;
  dueOn: string;
  feeSettled: boolean;
  sittingId: string | null;
  state: SittingState;
};
export type ReleaseView = Omit<Row, "releasedAt"> & {
  releasedAt: string;
  checkCards: Record<string, CheckCardView>;
  /** Released outside a bound of the release check, with the reason given. */
  outside: ReleasedOutside[];
  assigned: AssignedLine[];
  technicians: { id: string; name: string }[];
};

export async function getRelease(actor: Actor, moduleId: string, number: string): Promise<ReleaseView | null> {
  authorize(can.readModules(actor, actor), "read the modules");
  if (!isId(moduleId)) return null;
  const { employerId } = actor;
  const [row] = await select<Row>(RELEASE, { moduleId, number, employerId });
  if (!row) return null;
  return {
    ...row,
    releasedAt: iso(row.releasedAt),
    checkCards: checkCards(row.checks),
    outside: await releasedOutside(row.id),
    assigned: await select<AssignedLine>(ASSIGNED, { releaseId: row.id }),
    technicians: await select<{ id: string; name: string }>(TECHNICIANS, { employerId }),
  };
}

const RELEASE = `
  SELECT r.id, r.module_id AS "moduleId", m.code, r.number, r.kind, r.title, r.tree, r.front_matter AS "frontMatter", r.checks,
    r.fingerprint, r.reason, p.name AS "releasedBy", r.released_at AS "releasedAt"
  FROM releases r JOIN modules m ON m.id = r.module_id JOIN people p ON p.id = r.released_by
  WHERE r.module_id = :moduleId AND r.number = :number AND r.employer_id = :employerId`;
const ASSIGNED = `
  SELECT a.id, p.name AS technician, a.due_on::text AS "dueOn", f.settled_at IS NOT NULL AS "feeSettled", s.id AS "sittingId",
    ${SITTING_STATE} AS state
  FROM assignments a JOIN releases r ON r.id = a.release_id JOIN people p ON p.id = a.technician_id JOIN fees f ON f.assignment_id = a.id
  LEFT JOIN sittings s ON s.assignment_id = a.id LEFT JOIN decisions d ON d.sitting_id = s.id
  LEFT JOIN certificates c ON c.sitting_id = s.id
  WHERE a.release_id = :releaseId ORDER BY a.assigned_at DESC`;
const TECHNICIANS = `
  SELECT p.id, p.name FROM people p JOIN role_grants g ON g.person_id = p.id
  WHERE g.employer_id = :employerId AND g.role = 'technician' AND g.ended_at IS NULL ORDER BY p.name`;
