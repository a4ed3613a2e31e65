import { beforeEach, describe, expect, test } from "vitest";
import { actOnReview } from "@/lib/commands/actOnReview";
import { makeMarkingRecord, makeSitting } from "../support/chain";
import { NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { makeFinding, makeReview } from "../support/reviews";
import { everythingStored, expectNothingLeft, jobsOf, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let review: { id: string };
let sitting: { id: string };
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  sitting = await makeSitting(firm);
  review = await makeReview(firm);
});
const found = async () => makeFinding({ review, record: await makeMarkingRecord(firm, { sitting }), met: false });
const act = (over: Partial<Parameters<typeof actOnReview>[1]> = {}, actor = firm.lead) =>
  actOnReview(actor, { reviewId: review.id, sittingId: sitting.id, act: "mark again", reason: "", ...over }, NOW);
const refused = async (run: () => Promise<unknown>, name: string) => {
  const before = await everythingStored();
  await expect(run()).rejects.toMatchObject({ name });
  expect(await everythingStored()).toEqual(before);
};

test("to mark again is kept and handed to the worker, once however often it is pressed", async () => {
  await found();
  const [one, two] = await Promise.all([act(), act()]);
  expect(two).toEqual(one);
  expect(await rowsOf("review_acts")).toMatchObject([{ id: one.id, act: "mark again", acted_by: firm.lead.personId }]);
  expect(await jobsOf("mark-again")).toEqual([{ actId: one.id }]);
  expect(await trailOf(firm.lead)).toEqual([{ act: "review_acts added", employer: firm.employer.id, key: one.id }]);
});

test("to leave it asks for a reason and causes nothing", async () => {
  await found();
  await refused(() => act({ act: "leave", reason: " " }), "InvalidError");
  await act({ act: "leave", reason: "The hand-in was read by eye." });
  expect(await rowsOf("review_acts")).toMatchObject([{ act: "leave", reason: "The hand-in was read by eye." }]);
  expect(await jobsOf("mark-again")).toEqual([]);
});

describe("refuses", () => {
  test("a second act of another kind", async () => {
    await found();
    await act();
    await refused(() => act({ act: "leave", reason: "Changed my mind." }), "ConflictError");
  });

  test("a sitting with a case that is not computed yet, and one that the review has nothing of", async () => {
    await makeMarkingRecord(firm, { sitting });
    await refused(() => act(), "ConflictError");
    const { id: sittingId } = await makeSitting(firm);
    await refused(() => act({ sittingId }), "NotFoundError");
  });

  refusals({
    allowed: "lead",
    setting: () => ({ firm, other, id: review.id }),
    act: (actor, reviewId) =>
      actOnReview(actor, { reviewId, sittingId: sitting.id, act: "mark again", reason: "" }, NOW),
  });
});

test("a failure at the end leaves neither act nor job", async () => {
  await found();
  await expectNothingLeft("review_acts", () => act());
});
