import { createHash } from "node:crypto";
import type { CheckPlan, PublicCase } from "@/lib/checks/kind";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import { daysFrom, minutesFrom, NOW } from "./clock";
import type { Firm } from "./factories";
import { insert, ownerRows } from "./owner";
import { checkPlan, frontMatter, LAG, markedRow, publicCase, TREE, writtenCase, writtenPlan } from "./samples";

/** Rows of the chain of records; people are in factories.ts, decision and certificate in certified.ts. */
export type Row<T = object> = { id: string } & T;
type Release = Row<{
  moduleId: string;
  number: string;
  title: string;
  fingerprint: string;
  checks: CheckPlan[];
  frontMatter: FrontMatter;
}>;
type Assignment = Row<{ releaseId: string; technicianId: string; employerId: string }>;
type Sitting = Row<{ number: string; assignmentId: string; releaseId: string; technicianId: string; lastDay: string }>;
type Case = Row<{ sittingId: string; checkId: string; number: number }>;
type MarkingRecord = Row<{ caseId: string; sequence: number; met: boolean }>;

/** Every step makes the steps before it unless they are given; columns given besides replace the usual ones. */
export type Given<Parents, Columns = object> = Partial<Parents> & Partial<Columns>;

let count = 0;
const next = () => (count += 1);

export async function makeModule(firm: Firm, over: { code?: string; title?: string; source?: string } = {}) {
  const { code = `TEST-${next()}`, title = "Prove a satellite", source = "Find the peak." } = over;
  const { personId } = firm.lead;
  const made = await insert<Row<{ code: string }>>("modules", {
    employerId: firm.employer.id,
    code,
    createdBy: personId,
  });
  await insert("drafts", { moduleId: made.id, title, source, savedBy: personId });
  await insert("draft_writers", { moduleId: made.id, personId });
  return made;
}

export async function makeRelease(
  firm: Firm,
  given: Given<{ module: Row }, Omit<Release, "id"> & { kind: string }> = {},
) {
  const { module = await makeModule(firm), ...columns } = given;
  const { personId } = firm.lead;
  const release = await insert<Release>("releases", {
    moduleId: module.id,
    employerId: firm.employer.id,
    number: "1.0",
    kind: "first",
    title: "Prove a satellite",
    source: "Find the peak.",
    tree: TREE,
    frontMatter: frontMatter(),
    checks: [checkPlan()],
    fingerprint: createHash("sha256")
      .update(`${module.id} ${columns.number ?? "1.0"}`)
      .digest("hex"),
    reason: "first release",
    releasedBy: personId,
    releasedAt: daysFrom(NOW, -20),
    ...columns,
  });
  for (const part of ["wrote", "released"]) await insert("release_writers", { releaseId: release.id, personId, part });
  return release;
}

/** With its fee, due and open. */
export async function makeAssignment(
  firm: Firm,
  given: Given<{ release: Row }, { technicianId: string; dueOn: string; exposureNote: string }> = {},
) {
  const { release = await makeRelease(firm), ...columns } = given;
  const assignment = await insert<Assignment>("assignments", {
    employerId: firm.employer.id,
    releaseId: release.id,
    technicianId: firm.technician.personId,
    dueOn: "2026-12-31",
    assignedBy: firm.lead.personId,
    assignedAt: daysFrom(NOW, -10),
    ...columns,
  });
  const { employerId } = assignment;
  await insert("fees", {
    assignmentId: assignment.id,
    employerId,
    amountMinor: 19_200,
    currency: "gbp",
    dueAt: daysFrom(NOW, -10),
  });
  return assignment;
}

/** Pay the open fee of an assignment by an order of its own. */
export async function settleFee(firm: Firm, assignment: Row): Promise<{ orderId: string }> {
  const order = await insert<Row>("orders", {
    employerId: firm.employer.id,
    amountMinor: 19_200,
    currency: "gbp",
    orderedBy: firm.administrator.personId,
    orderedAt: daysFrom(NOW, -9),
    paidAt: daysFrom(NOW, -9),
  });
  const sql = "UPDATE fees SET order_id = $1, settled_at = $2 WHERE assignment_id = $3";
  await ownerRows(sql, [order.id, daysFrom(NOW, -9), assignment.id]);
  return { orderId: order.id };
}

export async function makeSitting(
  firm: Firm,
  given: Given<{ assignment: Assignment }, { startedAt: Date; lastDay: string }> = {},
) {
  const { assignment: earlier, ...columns } = given;
  const assignment = earlier ?? (await makeAssignment(firm));
  const [fee] = await ownerRows<{ settled: boolean }>(
    "SELECT settled_at IS NOT NULL AS settled FROM fees WHERE assignment_id = $1",
    [assignment.id],
  );
  if (!fee?.settled) await settleFee(firm, assignment);
  return insert<Sitting>("sittings", {
    assignmentId: assignment.id,
    releaseId: assignment.releaseId,
    technicianId: assignment.technicianId,
    employerId: firm.employer.id,
    terms: "2026-12",
    startedAt: daysFrom(NOW, -2),
    lastDay: "2026-12-29",
    ...columns,
  });
}

/** Asked for and not drawn yet. */
export async function makeCase(
  firm: Firm,
  given: Given<{ sitting: Row }, { checkId: string; kind: string; number: number; requestedAt: Date }> = {},
) {
  const { sitting = await makeSitting(firm), ...columns } = given;
  return insert<Case>("cases", {
    sittingId: sitting.id,
    checkId: "reading",
    kind: "correlator-reading",
    kindVersion: 1,
    number: 1,
    requestedAt: minutesFrom(NOW, -11),
    ...columns,
  });
}

/** Drawn ten minutes before NOW, open for ten more. */
export async function makeOpenCase(
  firm: Firm,
  given: Given<{ case: Case; sitting: Row }, { view: PublicCase; openedAt: Date; endsAt: Date }> = {},
) {
  const { case: asked, sitting, ...columns } = given;
  const opened = asked ?? (await makeCase(firm, { sitting }));
  await insert("case_views", {
    caseId: opened.id,
    view: publicCase(),
    draws: 12,
    openedAt: minutesFrom(NOW, -10),
    endsAt: minutesFrom(NOW, 10),
    ...columns,
  });
  return opened;
}

/** A case of a written account of two lines, drawn and open, in a sitting of that check alone. */
export async function makeWrittenCase(firm: Firm, given: { sitting?: Row } = {}) {
  const sitting = given.sitting ?? (await makeWrittenSitting(firm));
  const asked = await makeCase(firm, { sitting, checkId: "account", kind: "written" });
  return makeOpenCase(firm, { case: asked, view: writtenCase() });
}

async function makeWrittenSitting(firm: Firm) {
  const checks = [writtenPlan()];
  const release = await makeRelease(firm, {
    checks,
    frontMatter: frontMatter({
      sitting: { days: 30, freshCases: 0, waitHours: 24 },
      require: { all: checks.map(({ id }) => id), some: null },
    }),
  });
  return makeSitting(firm, { assignment: await makeAssignment(firm, { release }) });
}

/** The same handed in, with an answer to the first line. */
export async function makeWrittenHandIn(firm: Firm, given: { sitting?: Row } = {}) {
  const answers = { "account.seen": "Two receivers shadowed by the crane." };
  return makeHandIn(firm, { case: await makeWrittenCase(firm, given), answers });
}

export async function makeHandIn(
  firm: Firm,
  given: Given<{ case: Case; sitting: Row }, { answers: object; handedInAt: Date }> = {},
) {
  const { case: asked, sitting, ...columns } = given;
  const opened = asked ?? (await makeOpenCase(firm, { sitting }));
  const answers = { "peak.lag": "88.75 chip" };
  await insert("hand_ins", {
    caseId: opened.id,
    answers,
    byClock: false,
    handedInAt: minutesFrom(NOW, -5),
    ...columns,
  });
  return opened;
}

export async function makeMarkingRecord(
  firm: Firm,
  given: Given<
    { case: Row; sitting: Row },
    { met: boolean; sequence: number; reason: string; rows: object[]; markedAt: Date }
  > = {},
) {
  const { case: asked, sitting, ...columns } = given;
  const handedIn = asked ?? (await makeHandIn(firm, { sitting }));
  const { met = true } = columns;
  return insert<MarkingRecord>("marking_records", {
    caseId: handedIn.id,
    sequence: 1,
    marking: "correlator-reading@1",
    engineVersion: "1.0.0",
    rows: [markedRow(met)],
    quantities: [{ of: "lag", label: LAG, critical: false, within: met }],
    withinCount: met ? 1 : 0,
    needs: 1,
    met,
    workings: [],
    durationMs: 40,
    markedAt: minutesFrom(NOW, -4),
    ...columns,
  });
}
