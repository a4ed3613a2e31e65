import { beforeEach, expect, test } from "vitest";
import { markAgain } from "@/lib/commands/markAgain";
import { getDecisionDesk } from "@/lib/queries/getDecisionDesk";
import { getMarkingRecord } from "@/lib/queries/getMarkingRecord";
import { listCertificateReviews } from "@/lib/queries/listCertificateReviews";
import { makeCertificate, makeDecision, makeStanding } from "../support/certified";
import { makeMarkingRecord, makeSitting } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { makeFinding, makeReview, MARKING, REASON, recordsOf } from "../support/reviews";
import { everythingStored, trailOf } from "../support/written";
import { PUBLIC_ORIGIN, rowsOf, stop } from "./tools";

const LATER = minutesFrom(NOW, 60);
let firm: Firm;
let sitting: Awaited<ReturnType<typeof makeSitting>>;
let review: { id: string };
beforeEach(async () => {
  firm = await makeFirm();
  sitting = await makeSitting(firm);
  review = await makeReview(firm);
});

/** A record of the sitting, what the review found of it, and the lead's act. */
async function acted(before: boolean, now: boolean) {
  const record = await makeMarkingRecord(firm, { sitting, met: before });
  await makeFinding({ review, record, met: now });
  const { id: actId } = await insert<{ id: string }>("review_acts", {
    ...{ reviewId: review.id, sittingId: sitting.id, act: "mark again", actedBy: firm.lead.personId, actedAt: NOW },
  });
  return { record, actId };
}
const again = (actId: string, now = () => LATER) => markAgain(actId, PUBLIC_ORIGIN, now);
type MailRow = { to_email: string; subject: string; body: string };
const mails = async () => (await rowsOf<MailRow>("mails")).map(({ subject }) => subject.replace(/:.*/, "")).sort();

test("adds the next record with the reason, keeps the first, and tells the technician", async () => {
  const { record, actId } = await acted(true, false);
  expect(await again(actId)).toBe("marked again");
  expect(await recordsOf(record.caseId)).toMatchObject([
    { id: record.id, sequence: 1, marking: "correlator-reading@1", met: true, reason: "" },
    { sequence: 2, marking: MARKING, met: false, reason: REASON },
  ]);
  const [mail] = (await rowsOf<MailRow>("mails")).filter(({ subject }) => subject.startsWith("Marked again"));
  expect(mail!.body).toContain(REASON);
  expect(mail!.body).toContain(`${PUBLIC_ORIGIN}/${firm.employer.slug}/sittings/${sitting.id}`);
  expect((await trailOf(firm.lead)).map(({ act }) => act)).toEqual(["marking_records added"]);
});

test("the newest record is the one that is shown, and the earlier one is reached from it", async () => {
  const { record, actId } = await acted(true, false);
  await again(actId);
  const newest = await getMarkingRecord(firm.technician, record.caseId);
  expect(newest).toMatchObject({ sequence: 2, met: false, reason: REASON });
  expect(newest!.records.map(({ sequence, met }) => [sequence, met])).toEqual([
    [2, false],
    [1, true],
  ]);
  expect(await getMarkingRecord(firm.technician, record.caseId, 1)).toMatchObject({ id: record.id, met: true });
  expect(await getMarkingRecord(firm.technician, record.caseId, 3)).toBe(null);
});

test("run twice, also at once, it is one record and one mail", async () => {
  const { record, actId } = await acted(true, false);
  expect((await Promise.all([again(actId), again(actId)])).sort()).toEqual(["marked again", "was marked again"]);
  expect(await again(actId)).toBe("was marked again");
  expect(await recordsOf(record.caseId)).toHaveLength(2);
  expect((await mails()).filter((subject) => subject === "Marked again")).toHaveLength(1);
});

test("a case that has got another record since is left", async () => {
  const { record, actId } = await acted(true, false);
  await makeMarkingRecord(firm, { case: { id: record.caseId }, sequence: 2, reason: "an appeal", met: true });
  expect(await again(actId)).toBe("was marked again");
  expect(await recordsOf(record.caseId)).toHaveLength(2);
});

test("killed half way, nothing is kept", async () => {
  const { actId } = await acted(true, false);
  const before = await everythingStored();
  let asked = 0;
  await expect(again(actId, () => ((asked += 1) === 1 ? LATER : stop()))).rejects.toThrow("killed");
  expect(await everythingStored()).toEqual(before);
});

test("a certificate whose sitting no longer meets the requirement waits for the decider until a standing is set", async () => {
  const { actId } = await acted(true, false);
  const decision = await makeDecision(firm, { sitting });
  const certificate = await makeCertificate(firm, { decision });
  expect(await listCertificateReviews(firm.decider)).toEqual([]);
  await again(actId);
  expect(await mails()).toEqual(["Certificate to review", "Marked again"]);
  const [mail] = (await rowsOf<MailRow>("mails")).filter(({ subject }) => subject.startsWith("Certificate"));
  expect(mail!.body).toContain(`${PUBLIC_ORIGIN}/${firm.employer.slug}/register/${certificate.number}`);
  expect(await listCertificateReviews(firm.decider)).toMatchObject([
    { number: certificate.number, sittingNumber: sitting.number, markedAt: LATER.toISOString() },
  ]);
  expect(await listCertificateReviews((await makeFirm()).decider)).toEqual([]);
  await expect(listCertificateReviews(firm.lead)).rejects.toMatchObject({ name: "ForbiddenError" });
  expect(await getDecisionDesk(firm.decider, sitting.id)).toMatchObject({ isMarkedAgain: true });
  expect(await rowsOf("decisions")).toMatchObject([{ id: decision.id, outcome: "competent" }]);
  await makeStanding(firm, certificate, { standing: "suspended", setAt: minutesFrom(LATER, 1) });
  expect(await listCertificateReviews(firm.decider)).toEqual([]);
  await makeStanding(firm, certificate, { standing: "valid", setAt: minutesFrom(LATER, 2) });
  expect(await listCertificateReviews(firm.decider)).toEqual([]);
});

test("the deciders hear of a sitting decided not yet competent that would now meet the requirement", async () => {
  const { actId } = await acted(false, true);
  await makeDecision(firm, { sitting, outcome: "not yet competent" });
  await again(actId);
  expect(await mails()).toEqual(["Marked again", "Would now meet the requirement"]);
});

test("where the outcome stands nobody but the technician is told", async () => {
  const { actId } = await acted(false, false);
  await makeDecision(firm, { sitting, outcome: "not yet competent" });
  expect(await again(actId)).toBe("was marked again");
  expect(await mails()).toEqual([]);
});

test("the deciders hear of an undecided sitting that is complete by it", async () => {
  const { actId } = await acted(false, true);
  await again(actId);
  expect(await mails()).toEqual(["For decision", "Marked again"]);
});
