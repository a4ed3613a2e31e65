import { makeCertificate } from "../support/certified";
import { makeMarkingRecord, makeSitting } from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";

const HASH = "0".repeat(64);

/** Tables of records: what stands in them is followed and never changed. */
export const RECORDS = [
  "assignments",
  "captures",
  "case_secrets",
  "case_views",
  "cases",
  "certificates",
  "closings",
  "decisions",
  "hand_ins",
  "job_acts",
  "marking_records",
  "marking_reviews",
  "question_answers",
  "questions",
  "release_checks",
  "release_writers",
  "released_checks",
  "releases",
  "review_acts",
  "review_findings",
  "sittings",
  "standings",
  "trail_entries",
  "trail_heads",
  "trail_links",
  "trainings",
] as const;

/** At least one row in every one of them. */
export async function makeEveryRecord(): Promise<void> {
  const firm = await makeFirm();
  const sitting = await makeSitting(firm);
  const { id: markingRecordId, caseId } = await makeMarkingRecord(firm, { sitting });
  await makeCertificate(firm);
  const { personId: askedBy } = firm.technician;
  const question = await insert<{ id: string }>("questions", {
    markingRecordId,
    quantity: "lag",
    words: "Why?",
    askedBy,
  });
  await insert("question_answers", {
    questionId: question.id,
    words: "See there.",
    answeredBy: firm.assessor.personId,
  });
  await insert("case_secrets", { caseId, sealed: Buffer.alloc(8), truthSha256: HASH, engineVersion: "1.0.0" });
  await insert("captures", {
    ...{ caseId, name: "a.sigmf-data", storageKey: "a", mediaType: "application/octet-stream", sizeBytes: 8 },
    sha256: HASH,
  });
  await insert("trainings", {
    ...{ employerId: firm.employer.id, trainerId: firm.lead.personId, technicianId: askedBy, endedOn: "2026-06-01" },
    recordedBy: firm.lead.personId,
  });
  const review = await insert<{ id: string }>("marking_reviews", {
    ...{ employerId: firm.employer.id, kind: "correlator-reading", kindVersion: 1, marking: "correlator-reading@1.2" },
    ...{ reason: "It was wrong.", cases: 1, askedBy: firm.lead.personId, askedAt: NOW },
  });
  await insert("review_findings", {
    ...{ reviewId: review.id, caseId, recordId: markingRecordId, metBefore: true, met: true, changedRows: [] },
    ...{ marking: {}, engineVersion: "1.0.0", durationMs: 40, foundAt: NOW },
  });
  await insert("review_acts", {
    ...{ reviewId: review.id, sittingId: sitting.id, act: "mark again", actedBy: firm.lead.personId, actedAt: NOW },
  });
  await insert("job_acts", {
    ...{ jobId: caseId, job: "mark-case", act: "try again", actedBy: firm.lead.personId, actedAt: NOW },
  });
  await insert("closings", { sittingId: sitting.id, unfinished: true, closedAt: NOW });
  const check = { fingerprint: HASH, plan: {}, engineVersion: "1.0.0", tally: {}, finishedAt: NOW };
  const { id: releaseCheckId } = await insert<{ id: string }>("release_checks", check);
  const { releaseId } = sitting;
  await insert("released_checks", { releaseId, checkId: "reading", releaseCheckId, within: true, reason: "" });
  const [entry] = await ownerRows<{ id: string }>("SELECT min(id)::text AS id FROM trail_entries");
  await insert("trail_links", { sequence: 1, entryId: entry!.id, entrySha256: HASH, linkSha256: HASH });
  await insert("trail_heads", { sequence: 1, linkSha256: HASH, signedAt: NOW, signature: "none" });
}
