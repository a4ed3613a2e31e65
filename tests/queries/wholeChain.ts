import { makeCertificate, makeDecision } from "../support/certified";
import {
  makeAssignment,
  makeCase,
  makeMarkingRecord,
  makeModule,
  makeRelease,
  makeSitting,
  makeWrittenHandIn,
} from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import type { Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { frontMatter, publicCase } from "../support/samples";

const FILE = { name: "a.sigmf-data", mediaType: "application/octet-stream", sizeBytes: 8, sha256: "0".repeat(64) };

/** All that a firm can have: a certificate, a sitting with an open case, one that waits for the decider, a fee that is due. */
export async function makeWholeChain(firm: Firm) {
  const made = await makeModule(firm);
  // One case of the same kind after the other: the usual limit would close the last of them.
  const sat = { days: 30, freshCases: 1, waitHours: 24, exposure: 12 };
  const release = await makeRelease(firm, { module: made, frontMatter: frontMatter({ sitting: sat }) });
  const outside = { checkId: "reading", within: false, reason: "A first edition, watched for a month." };
  await insert("released_checks", { releaseId: release.id, ...outside });
  const assignment = await makeAssignment(firm, { release });
  const sitting = await makeSitting(firm, { assignment });
  const record = await makeMarkingRecord(firm, { sitting });
  const { personId: askedBy } = firm.technician;
  await insert("questions", { markingRecordId: record.id, quantity: "lag", words: "Why this peak?", askedBy });
  const decision = await makeDecision(firm, { sitting });
  const certificate = await makeCertificate(firm, { decision });
  const second = await makeSitting(firm, { assignment: await makeAssignment(firm, { release }) });
  const open = await makeOpenCaseWithFile(firm, second);
  const waiting = await makeSitting(firm, { assignment: await makeAssignment(firm, { release }) });
  await makeMarkingRecord(firm, { sitting: waiting, met: false });
  const written = await makeWrittenHandIn(firm);
  const due = await makeAssignment(firm, { release });
  const [order] = await ownerRows<{ id: string }>("SELECT order_id AS id FROM fees WHERE assignment_id = $1", [
    assignment.id,
  ]);
  return {
    module: made,
    release,
    assignment,
    sitting,
    record,
    decision,
    certificate,
    second,
    open,
    waiting,
    written,
    due,
    order: order!,
  };
}
export type WholeChain = Awaited<ReturnType<typeof makeWholeChain>>;

async function makeOpenCaseWithFile(firm: Firm, sitting: { id: string }) {
  const open = await makeCase(firm, { sitting });
  const times = { openedAt: minutesFrom(NOW, -10), endsAt: minutesFrom(NOW, 10) };
  await insert("case_views", { caseId: open.id, view: publicCase(), files: [FILE], draws: 12, ...times });
  await insert("captures", { caseId: open.id, storageKey: "a", ...FILE });
  const saved = { answers: { "peak.lag": "8 chip" }, revision: 3, savedAt: NOW };
  await insert("case_answers", { caseId: open.id, ...saved });
  return open;
}
