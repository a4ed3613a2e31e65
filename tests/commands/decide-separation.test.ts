import { beforeEach, expect, test } from "vitest";
import { assignRelease } from "@/lib/commands/assignRelease";
import { decide } from "@/lib/commands/decide";
import type { Actor } from "@/lib/policies/actor";
import { makeAssignment, makeMarkingRecord, makeRelease, makeSitting } from "../support/chain";
import { NOW } from "../support/clock";
import { makeActor, makeEmployer, makeFirm, type Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { everythingStored, rowsOf } from "../support/written";

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});

/** A sitting whose check is met, of the technician or whoever is named, on a release that others made and assigned. */
async function readySitting(given: { technicianId?: string; assignedBy?: Actor } = {}) {
  const { technicianId = firm.technician.personId, assignedBy = firm.lead } = given;
  const release = await makeRelease(firm);
  const order = { releaseId: release.id, technicianId, dueOn: "2026-12-31", exposureNote: null };
  const { id } = await assignRelease(assignedBy, order, NOW);
  const [assignment] = await ownerRows<Awaited<ReturnType<typeof makeAssignment>>>(ASSIGNMENT, [id]);
  const sitting = await makeSitting(firm, { assignment: assignment! });
  await makeMarkingRecord(firm, { sitting });
  return sitting;
}
const ASSIGNMENT = `
  SELECT id, release_id AS "releaseId", technician_id AS "technicianId", employer_id AS "employerId"
  FROM assignments WHERE id = $1`;

const decideOn = (actor: Actor, sittingId: string) =>
  decide(actor, { sittingId, outcome: "competent", reason: "Read with care.", declaration: "No interest." }, NOW);

async function expectBarred(actor: Actor, sittingId: string, bar: string): Promise<void> {
  const before = await everythingStored();
  await expect(decideOn(actor, sittingId)).rejects.toMatchObject({
    name: "ForbiddenError",
    publicMessage: `You may not decide on this sitting. ${bar}`,
  });
  expect(await everythingStored()).toEqual(before);
}
const train = (trainerId: string, endedOn: string, over: object = {}) =>
  insert("trainings", {
    ...{ employerId: firm.employer.id, trainerId, technicianId: firm.technician.personId, endedOn },
    recordedBy: firm.lead.personId,
    ...over,
  });

test("a decider without a hand in it decides", async () => {
  const sitting = await readySitting();
  await decideOn(firm.decider, sitting.id);
  expect(await rowsOf("decisions")).toMatchObject([{ sitting_id: sitting.id }]);
});

test("the candidate is refused, decider or not", async () => {
  const both = await makeActor(firm.employer, ["technician", "decider"], { passwordAt: NOW });
  const sitting = await readySitting({ technicianId: both.personId });
  await expectBarred(both, sitting.id, "You are the candidate.");
});

test("whoever assigned the sitting is refused", async () => {
  const both = await makeActor(firm.employer, ["lead", "decider"], { passwordAt: NOW });
  const sitting = await readySitting({ assignedBy: both });
  await expectBarred(both, sitting.id, "You assigned this sitting.");
});

test.each([
  ["wrote part of", "wrote", "You wrote part of this release."],
  ["released", "released", "You released this release."],
])("whoever %s the release is refused", async (_what, part, bar) => {
  const sitting = await readySitting();
  await insert("release_writers", { releaseId: sitting.releaseId, personId: firm.decider.personId, part });
  await expectBarred(firm.decider, sitting.id, bar);
});

test("whoever had a hand in another release only may decide", async () => {
  const sitting = await readySitting();
  const earlier = await makeRelease(firm);
  await insert("release_writers", { releaseId: earlier.id, personId: firm.decider.personId, part: "wrote" });
  await decideOn(firm.decider, sitting.id);
  expect(await rowsOf("decisions")).toHaveLength(1);
});

// Two years back from 1 December 2026, that day included.
test.each(["2024-12-01", "2026-11-30"])("a trainer is refused when the training ended on %s", async (endedOn) => {
  const sitting = await readySitting();
  await train(firm.decider.personId, endedOn);
  await expectBarred(firm.decider, sitting.id, "You trained this candidate within the last two years.");
});

test("a training at another employer bars as well", async () => {
  const sitting = await readySitting();
  await train(firm.decider.personId, "2026-06-01", { employerId: (await makeEmployer()).id });
  await expectBarred(firm.decider, sitting.id, "You trained this candidate within the last two years.");
});

test("a training that ended longer ago does not bar, nor does somebody else's or of somebody else", async () => {
  const sitting = await readySitting();
  await train(firm.decider.personId, "2024-11-30");
  await train(firm.lead.personId, "2026-11-01");
  await train(firm.decider.personId, "2026-11-01", { technicianId: firm.assessor.personId });
  await decideOn(firm.decider, sitting.id);
  expect(await rowsOf("decisions")).toHaveLength(1);
});

test("the bar is told before the password is asked for", async () => {
  const sitting = await readySitting();
  await train(firm.decider.personId, "2026-11-01");
  await expect(decideOn({ ...firm.decider, passwordAt: null }, sitting.id)).rejects.toMatchObject({
    name: "ForbiddenError",
  });
});
