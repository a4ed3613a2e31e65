import "server-only";
import type { CheckPlan } from "@/lib/checks/kind";
import { select } from "@/lib/db";
import { checkCards, type CheckCardView } from "@/lib/mdx/checkCards";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { nextCaseOf, type EarlierCase, type NextCase } from "@/lib/policies/nextCase";
import { iso, isId, isoOrNull } from "./findOwn";
import { SITTING_STATE, type SittingState } from "./sittingState";

type Row = {
  id: string;
  number: string;
  employerId: string;
  technicianId: string;
  technician: string;
  moduleId: string;
  code: string;
  title: string;
  release: string;
  fingerprint: string;
  tree: ModuleTree;
  frontMatter: FrontMatter;
  checks: CheckPlan[];
  startedAt: Date;
  lastDay: string;
  state: SittingState;
  outcome: "competent" | "not yet competent" | null;
  decisionReason: string | null;
  decidedAt: Date | null;
  decider: string | null;
  certificate: string | null;
};
type CaseRow = EarlierCase & { checkId: string; openedAt: Date | null; endsAt: Date | null; byClock: boolean | null };

export type CaseLine = {
  id: string;
  number: number;
  state: EarlierCase["state"];
  met: boolean | null;
  openedAt: string | null;
  endsAt: string | null;
  handedInAt: string | null;
  byClock: boolean | null;
};
/** Without its parameters: in those of a lead's own check stand the formulas of the right answers. */
type ShownPlan = Omit<CheckPlan, "parameters">;
export type CheckLine = { plan: ShownPlan; cases: CaseLine[]; next: NextCase; met: boolean; required: boolean };
export type SittingView = Omit<Row, "employerId" | "technicianId" | "startedAt" | "decidedAt" | "checks"> & {
  startedAt: string;
  decidedAt: string | null;
  isMine: boolean;
  checks: CheckLine[];
  checkCards: Record<string, CheckCardView>;
};

export async function getSitting(actor: Actor, id: string, now = new Date()): Promise<SittingView | null> {
  if (!isId(id)) return null;
  const [row] = await select<Row>(SITTING, { id, employerId: actor.employerId });
  if (!row || !can.readSitting(actor, row)) return null;
  const cases = await select<CaseRow>(CASES, { id });
  const { employerId: _employer, technicianId, ...view } = row;
  return {
    ...view,
    startedAt: iso(row.startedAt),
    decidedAt: isoOrNull(row.decidedAt),
    isMine: technicianId === actor.personId,
    checkCards: checkCards(row.checks),
    checks: row.checks.map((plan) => checkLine(plan, row.frontMatter, cases, now)),
  };
}

function checkLine(
  { parameters: _parameters, ...plan }: CheckPlan,
  { sitting, require }: FrontMatter,
  all: CaseRow[],
  now: Date,
): CheckLine {
  const cases = all.filter(({ checkId }) => checkId === plan.id);
  return {
    plan,
    cases: cases.map((one) => ({
      id: one.id,
      number: one.number,
      state: one.state,
      met: one.met,
      openedAt: isoOrNull(one.openedAt),
      endsAt: isoOrNull(one.endsAt),
      handedInAt: isoOrNull(one.handedInAt),
      byClock: one.byClock,
    })),
    next: nextCaseOf(cases, sitting, now),
    met: cases.some((one) => one.met === true),
    required: require.all.includes(plan.id),
  };
}

const SITTING = `
  SELECT s.id, s.number::text AS number, s.employer_id AS "employerId", s.technician_id AS "technicianId", p.name AS technician,
    m.id AS "moduleId", m.code, r.title, r.number AS release, r.fingerprint, r.tree, r.front_matter AS "frontMatter", r.checks,
    s.started_at AS "startedAt", s.last_day::text AS "lastDay", ${SITTING_STATE} AS state, d.outcome,
    d.reason AS "decisionReason", d.decided_at AS "decidedAt", dp.name AS decider, c.number AS certificate
  FROM sittings s JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id
  JOIN people p ON p.id = s.technician_id JOIN fees f ON f.assignment_id = s.assignment_id
  LEFT JOIN decisions d ON d.sitting_id = s.id LEFT JOIN people dp ON dp.id = d.decided_by
  LEFT JOIN certificates c ON c.sitting_id = s.id
  WHERE s.id = :id AND s.employer_id = :employerId`;
const CASES = `
  SELECT id, check_id AS "checkId", number, state, met, opened_at AS "openedAt", ends_at AS "endsAt",
    handed_in_at AS "handedInAt", by_clock AS "byClock"
  FROM case_states WHERE sitting_id = :id ORDER BY check_id, number`;
