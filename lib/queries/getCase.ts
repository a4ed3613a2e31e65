import "server-only";
import type { Answers, CheckPlan, PublicCase } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { briefOf } from "@/lib/mdx/briefOf";
import type { ModuleTree, TreeElement } from "@/lib/mdx/moduleTree";
import { iso, isId, isoOrNull } from "./findOwn";
import { CHECK_ELEMENT } from "./sittingState";

type Row = {
  id: string;
  sittingId: string;
  sittingNumber: string;
  employerId: string;
  technicianId: string;
  checkId: string;
  number: number;
  state: "building" | "open" | "handed in" | "marked";
  code: string;
  title: string;
  checks: CheckPlan[];
  freshCases: number;
  view: PublicCase | null;
  check: TreeElement | null;
  files: { name: string; mediaType: string; sizeBytes: number; sha256: string }[] | null;
  openedAt: Date | null;
  endsAt: Date | null;
  handedInAt: Date | null;
  byClock: boolean | null;
  answers: Answers | null;
  revision: number | null;
  savedAt: Date | null;
};

/** Field by field what the person who sits may see: no seed, no truth and nothing computed is in reach of this query. */
export type OpenCaseView = {
  id: string;
  sittingId: string;
  sittingNumber: string;
  plan: Pick<CheckPlan, "id" | "kind" | "title" | "minutes">;
  number: number;
  ofCases: number;
  state: Row["state"];
  code: string;
  title: string;
  view: PublicCase | null;
  /** What the lead wrote inside the check. */
  brief: ModuleTree | null;
  files: NonNullable<Row["files"]>;
  openedAt: string | null;
  endsAt: string | null;
  serverNow: string;
  handedInAt: string | null;
  byClock: boolean | null;
  answers: Answers;
  revision: number;
  savedAt: string | null;
};

export async function getCase(actor: Actor, id: string, now = new Date()): Promise<OpenCaseView | null> {
  if (!isId(id)) return null;
  const [row] = await select<Row>(SQL, { id, employerId: actor.employerId });
  if (!row || !can.sit(actor, row)) return null;
  const { id: checkId, kind, title, minutes } = row.checks.find((plan) => plan.id === row.checkId)!;
  return {
    id: row.id,
    sittingId: row.sittingId,
    sittingNumber: row.sittingNumber,
    plan: { id: checkId, kind, title, minutes },
    number: row.number,
    ofCases: row.freshCases + 1,
    state: row.state,
    code: row.code,
    title: row.title,
    view: row.view,
    brief: briefOf(row.check),
    files: row.files ?? [],
    openedAt: isoOrNull(row.openedAt),
    endsAt: isoOrNull(row.endsAt),
    serverNow: iso(now),
    handedInAt: isoOrNull(row.handedInAt),
    byClock: row.byClock,
    answers: row.answers ?? {},
    revision: row.revision ?? 0,
    savedAt: isoOrNull(row.savedAt),
  };
}

const SQL = `
  SELECT x.id, x.sitting_id AS "sittingId", s.number::text AS "sittingNumber", s.employer_id AS "employerId",
    s.technician_id AS "technicianId", x.check_id AS "checkId", x.number, x.state, m.code, r.title, r.checks,
    (r.front_matter #>> '{sitting,freshCases}')::int AS "freshCases", v.view, ${CHECK_ELEMENT} AS "check", v.files, x.opened_at AS "openedAt",
    x.ends_at AS "endsAt", x.handed_in_at AS "handedInAt", x.by_clock AS "byClock",
    coalesce(h.answers, a.answers) AS answers, a.revision, a.saved_at AS "savedAt"
  FROM case_states x JOIN sittings s ON s.id = x.sitting_id JOIN releases r ON r.id = s.release_id
  JOIN modules m ON m.id = r.module_id LEFT JOIN case_views v ON v.case_id = x.id
  LEFT JOIN case_answers a ON a.case_id = x.id LEFT JOIN hand_ins h ON h.case_id = x.id
  WHERE x.id = :id AND s.employer_id = :employerId`;
