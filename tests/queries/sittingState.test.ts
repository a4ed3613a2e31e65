import { beforeEach, expect, test } from "vitest";
import { getSitting } from "@/lib/queries/getSitting";
import { listQueue } from "@/lib/queries/listQueue";
import { listOwnSittings } from "@/lib/queries/listSittings";
import { makeCertificate, makeDecision } from "../support/certified";
import {
  makeAssignment,
  makeCase,
  makeHandIn,
  makeMarkingRecord,
  makeOpenCase,
  makeRelease,
  makeSitting,
  settleFee,
} from "../support/chain";
import { makeFirm, type Firm } from "../support/factories";
import { checkPlan } from "../support/samples";

// The state follows from PostgreSQL's own clock, so that these last days are far from any day it may be.
const [LONG_PAST, FAR_AHEAD] = ["2020-01-31", "2999-12-31"];

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});
const state = async () => (await listOwnSittings(firm.technician)).map((row) => row.state);
const queue = async () => (await listQueue(firm.decider)).map(({ sittingId }) => sittingId);

test("from the assignment to the sitting", async () => {
  const assignment = await makeAssignment(firm);
  expect(await state()).toEqual(["fee open"]);
  await settleFee(firm, assignment);
  expect(await state()).toEqual(["not started"]);
  await makeSitting(firm, { assignment, lastDay: FAR_AHEAD });
  expect(await state()).toEqual(["sitting"]);
});

test("a sitting is for decision when every check is marked and no case is on its way", async () => {
  const checks = [checkPlan(), checkPlan({ id: "plan" })];
  const assignment = await makeAssignment(firm, { release: await makeRelease(firm, { checks }) });
  const sitting = await makeSitting(firm, { assignment, lastDay: FAR_AHEAD });
  await makeMarkingRecord(firm, { sitting, met: false });
  expect(await state()).toEqual(["sitting"]);
  await makeMarkingRecord(firm, { case: await opened(await makeCase(firm, { sitting, checkId: "plan" })) });
  expect(await state()).toEqual(["for decision"]);
  expect(await queue()).toEqual([sitting.id]);
  const fresh = await makeCase(firm, { sitting, number: 2 });
  expect(await state()).toEqual(["sitting"]);
  await opened(fresh);
  expect(await state()).toEqual(["sitting"]);
  expect(await queue()).toEqual([]);
  expect((await getSitting(firm.technician, sitting.id))?.state).toBe("sitting");
});
const opened = async (one: Awaited<ReturnType<typeof makeCase>>) =>
  makeHandIn(firm, { case: await makeOpenCase(firm, { case: one }) });

test("after the last day it is for decision with what there is, once nothing is on its way", async () => {
  const sitting = await makeSitting(firm, { lastDay: LONG_PAST });
  expect(await state()).toEqual(["for decision"]);
  const handedIn = await makeHandIn(firm, { sitting });
  expect(await state()).toEqual(["sitting"]);
  await makeMarkingRecord(firm, { case: handedIn, met: false });
  expect(await queue()).toEqual([sitting.id]);
});

test("decided: issuing, then the certificate; or not yet competent", async () => {
  const decision = await makeDecision(firm);
  expect(await state()).toEqual(["issuing"]);
  await makeCertificate(firm, { decision });
  expect(await state()).toEqual(["certificate issued"]);
  expect(await queue()).toEqual([]);
  await makeDecision(firm, { outcome: "not yet competent" });
  expect((await state()).sort()).toEqual(["certificate issued", "not yet competent"]);
});
