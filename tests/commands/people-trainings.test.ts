import { beforeEach, expect, test } from "vitest";
import { recordTraining } from "@/lib/commands/recordTraining";
import { ForbiddenError, InvalidError, NotFoundError } from "@/lib/errors";
import { NOW } from "@/tests/support/clock";
import { makeFirm, type Firm } from "@/tests/support/factories";
import { ownerRows } from "@/tests/support/owner";

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});

const training = (over: object = {}) => ({
  technicianId: firm.technician.personId,
  trainerId: firm.decider.personId,
  endedOn: "2026-11-30",
  ...over,
});
const recorded = () => ownerRows("SELECT trainer_id, ended_on, recorded_by FROM trainings");

test.each(["lead", "administrator"] as const)("recorded by the %s: who trained, and when it ended", async (who) => {
  await recordTraining(firm[who], training(), NOW);
  expect(await recorded()).toEqual([
    { trainer_id: firm.decider.personId, ended_on: "2026-11-30", recorded_by: firm[who].personId },
  ]);
});

test.each(["technician", "assessor", "decider"] as const)("a %s may not", async (who) => {
  await expect(recordTraining(firm[who], training(), NOW)).rejects.toBeInstanceOf(ForbiddenError);
  expect(await recorded()).toEqual([]);
});

test("today is the last day there is, in the firm's own time zone", async () => {
  await recordTraining(firm.lead, training({ endedOn: "2026-12-01" }), NOW);
  const tomorrow = recordTraining(firm.lead, training({ endedOn: "2026-12-02" }), NOW);
  await expect(tomorrow).rejects.toMatchObject({ fields: { endedOn: [expect.any(String)] } });
  // 10:00 in London is 23:00 of the same day in Auckland, and two hours later the next.
  const far = await makeFirm({ timeZone: "Pacific/Auckland" });
  const there = { technicianId: far.technician.personId, trainerId: far.decider.personId, endedOn: "2026-12-02" };
  await recordTraining(far.lead, there, new Date("2026-12-01T12:00:00Z"));
});

test("nobody trains oneself", async () => {
  const self = recordTraining(firm.lead, training({ trainerId: firm.technician.personId }), NOW);
  await expect(self).rejects.toBeInstanceOf(InvalidError);
});

test.each(["technicianId", "trainerId"] as const)("another firm's person as %s looks like nobody", async (field) => {
  const other = await makeFirm();
  const strange = recordTraining(firm.lead, training({ [field]: other.assessor.personId }), NOW);
  await expect(strange).rejects.toBeInstanceOf(NotFoundError);
});
