import "server-only";
import type { CheckPlan } from "@/lib/checks/kind";
import { dayIn } from "@/lib/calendar";
import { select } from "@/lib/db";
import { checkCards, type CheckCardView } from "@/lib/mdx/checkCards";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";
import type { Actor } from "@/lib/policies/actor";
import { can } from "@/lib/policies/can";
import { exposedUntil, exposureReason, type OpenedCase } from "@/lib/policies/exposure";
import { nextCaseOf, type EarlierCase, type NextCase } from "@/lib/policies/nextCase";
import { iso, isId, isoOrNull } from "./findOwn";
import { openedCases } from "./openedCases";
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
  exposureNote: string | null;
  timeZone: string;
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
export type SittingView = Omit<
  Row,
  "employerId" | "technicianId" | "startedAt" | "decidedAt" | "checks" | "exposureNote" | "timeZone"
> & {
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
  const { employerId: _employer, technicianId, exposureNote, timeZone, ...view } = row;
  const opened = exposureNote === null ? await openedCases(row, now) : [];
  const today = dayIn(timeZone, now);
  return {
    ...view,
    startedAt: iso(row.startedAt),
    decidedAt: isoOrNull(row.decidedAt),
    isMine: technicianId === actor.personId,
    checkCards: checkCards(row.checks),
    checks: row.checks.map((plan) => checkLine(plan, row, { cases, opened }, { now, today })),
  };
}

function checkLine(
  { parameters: _parameters, ...plan }: CheckPlan,
  { moduleId, frontMatter: { sitting, require } }: Pick<Row, "moduleId" | "frontMatter">,
  all: { cases: CaseRow[]; opened: OpenedCase[] },
  { now, today }: { now: Date; today: string },
): CheckLine {
  const { id, kind } = plan;
  const from = exposedUntil({ id, kind, moduleId }, all.opened, sitting, today);
  const cases = all.cases.filter(({ checkId }) => checkId === plan.id);
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
    next: nextCaseOf(cases, sitting, now, from && exposureReason(sitting, from)),
    met: cases.some((one) => one.met === true),
    required: require.all.includes(plan.id),
  };
}

const SITTING = `
  SELECT s.id, s.number::text AS number, s.employer_id AS "employerId", s.technician_id AS "technicianId", p.name AS technician,
    m.id AS "moduleId", m.code, r.title, r.number AS release, r.fingerprint, r.tree, r.front_matter AS "frontMatter", r.checks,
    s.started_at AS "startedAt", s.last_day::text AS "lastDay", ${SITTING_STATE} AS state, d.outcome,
    d.reason AS "decisionReason", d.decided_at AS "decidedAt", dp.name AS decider, c.number AS certificate,
    a.exposure_note AS "exposureNote", e.time_zone AS "timeZone"
  FROM sittings s JOIN releases r ON r.id = s.release_id JOIN modules m ON m.id = r.module_id
  JOIN assignments a ON a.id = s.assignment_id JOIN employers e ON e.id = s.employer_id
  JOIN people p ON p.id = s.technician_id JOIN fees f ON f.assignment_id = s.assignment_id
  LEFT JOIN decisions d ON d.sitting_id = s.id LEFT JOIN people dp ON dp.id = d.decided_by
  LEFT JOIN certificates c ON c.sitting_id = s.id
  WHERE s.id = :id AND s.employer_id = :employerId`;
const CASES = `
  SELECT id, check_id AS "checkId", number, state, met, opened_at AS "openedAt", ends_at AS "endsAt",
    handed_in_at AS "handedInAt", by_clock AS "byClock"
  FROM case_states WHERE sitting_id = :id ORDER BY check_id, number`;
