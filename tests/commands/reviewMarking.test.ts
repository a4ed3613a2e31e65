import { beforeEach, describe, expect, test } from "vitest";
import { reviewMarking } from "@/lib/commands/reviewMarking";
import { listCorrections } from "@/lib/queries/listCorrections";
import { makeCase, makeHandIn, makeMarkingRecord, makeOpenCase, makeSitting } from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { CORRECTION, makeFinding, makeReview, MARKING, REASON } from "../support/reviews";
import { everythingStored, expectNothingLeft, jobsOf, rowsOf, trailOf } from "../support/written";

let firm: Firm;
let other: Firm;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
});
const review = (actor = firm.lead, marking = MARKING) => reviewMarking(actor, marking, NOW, [CORRECTION]);
const list = (actor = firm.lead) => listCorrections(actor, [CORRECTION]);

test("has the worker compute every case of the firm that an older marking marked", async () => {
  const records = [await makeMarkingRecord(firm), await makeMarkingRecord(firm, { met: false })];
  await makeMarkingRecord(other);
  // Neither handed in, nor of this kind.
  await makeOpenCase(firm);
  const sitting = await makeSitting(firm);
  const elsewhere = await makeOpenCase(firm, { case: await makeCase(firm, { sitting, kind: "chain" }) });
  await makeMarkingRecord(firm, { case: await makeHandIn(firm, { case: elsewhere }) });

  expect(await list()).toEqual([
    { marking: MARKING, title: expect.any(String), reason: REASON, older: 2, review: null },
  ]);
  const { id: reviewId } = await review();
  expect(await rowsOf("marking_reviews")).toMatchObject([{ id: reviewId, marking: MARKING, reason: REASON, cases: 2 }]);
  const jobs = (await jobsOf("review-case")).map(({ caseId }) => caseId).sort();
  expect(jobs).toEqual(records.map(({ caseId }) => caseId).sort());
  expect(await rowsOf("marking_records")).toHaveLength(4);
  const [{ review: shown } = { review: null }] = await list();
  expect(shown).toMatchObject({ id: reviewId, cases: 2, computed: 0, changed: [], unchanged: 0 });
});

test("stands in the trail with who asked, and for which firm", async () => {
  await makeMarkingRecord(firm);
  const { id } = await review();
  expect(await trailOf(firm.lead)).toEqual([{ act: "marking_reviews added", employer: firm.employer.id, key: id }]);
});

test("pressed twice, also at once, it is one review and one job a case", async () => {
  await makeMarkingRecord(firm);
  const [one, two] = await Promise.all([review(), review()]);
  expect(two).toEqual(one);
  expect(await review()).toEqual(one);
  expect(await jobsOf("review-case")).toHaveLength(1);
});

test("lists the sittings that would come out different, with the certificate, and counts the rest", async () => {
  const asked = await makeReview(firm, { cases: 2 });
  const falls = await makeMarkingRecord(firm);
  const stays = await makeMarkingRecord(firm);
  await makeFinding({ review: asked, record: falls, met: false });
  await makeFinding({ review: asked, record: stays, met: true });
  const [{ review: shown } = { review: null }] = await list();
  expect(shown).toMatchObject({ computed: 2, unchanged: 1 });
  expect(shown!.changed).toMatchObject([
    {
      requirement: { before: true, now: false },
      ...{ outcome: null, certificate: null, act: null },
      cases: [{ caseId: falls.caseId, metBefore: true, met: false, number: 1 }],
    },
  ]);
});

describe("refuses", () => {
  const refused = async (act: () => Promise<unknown>, name: string) => {
    const before = await everythingStored();
    await expect(act()).rejects.toMatchObject({ name });
    expect(await everythingStored()).toEqual(before);
  };

  test("everybody but the lead, to ask and to read", async () => {
    await makeMarkingRecord(firm);
    for (const actor of [firm.technician, firm.assessor, firm.decider, firm.administrator]) {
      await refused(() => review(actor), "ForbiddenError");
      await refused(() => list(actor), "ForbiddenError");
    }
  });

  test("a marking that is no correction, and a firm without a record of an older one", async () => {
    await makeMarkingRecord(firm);
    await refused(() => review(firm.lead, "correlator-reading@1"), "NotFoundError");
    await refused(() => review(other.lead), "ConflictError");
  });

  test("a lead of another firm sees nothing of it", async () => {
    const record = await makeMarkingRecord(firm);
    await makeFinding({ review: await makeReview(firm), record, met: false });
    expect(await list(other.lead)).toMatchObject([{ older: 0, review: null }]);
  });
});

test("a failure at the end leaves neither review nor job", async () => {
  await makeMarkingRecord(firm);
  await expectNothingLeft("marking_reviews", () => review());
});
