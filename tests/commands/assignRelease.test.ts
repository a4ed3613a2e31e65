import { beforeEach, describe, expect, test } from "vitest";
import { assignRelease } from "@/lib/commands/assignRelease";
import { makeDecision } from "../support/certified";
import { makeAssignment, makeCase, makeRelease, makeSitting } from "../support/chain";
import { daysFrom, NOW } from "../support/clock";
import { grantTo, makeActor, makeFirm, makePerson, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { everythingStored, expectNothingLeft, jobsOf, rowsOf, trailOf } from "../support/written";
import { frontMatter } from "../support/samples";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let release: Awaited<ReturnType<typeof makeRelease>>;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  release = await makeRelease(firm);
});
const order = (over: Partial<Parameters<typeof assignRelease>[1]> = {}) => ({
  releaseId: release.id,
  technicianId: firm.technician.personId,
  dueOn: "2026-12-20",
  exposureNote: null,
  ...over,
});
const emailOf = async (personId: string) =>
  (await ownerRows<{ email: string }>("SELECT email FROM people WHERE id = $1", [personId]))[0]!.email;
type Mail = { id: string; to_email: string; subject: string; body: string };

test("gives the technician a sitting and has its fee fall due", async () => {
  const { id } = await assignRelease(firm.lead, order(), NOW);
  expect(await rowsOf("assignments")).toMatchObject([
    {
      ...{ id, release_id: release.id, technician_id: firm.technician.personId, due_on: "2026-12-20" },
      ...{ employer_id: firm.employer.id, assigned_by: firm.lead.personId },
    },
  ]);
  expect(await rowsOf("fees")).toMatchObject([
    {
      ...{ assignment_id: id, employer_id: firm.employer.id, order_id: null, settled_at: null },
      // The installation's own price, 192 pounds.
      ...{ amount_minor: 19_200, currency: "gbp" },
    },
  ]);
});

test("tells the technician what is to be sat by when, and every administrator what is to be paid", async () => {
  const second = await makeActor(firm.employer, ["administrator"]);
  const { id } = await assignRelease(firm.lead, order(), NOW);
  const mails = await rowsOf<Mail>("mails");
  const people = [firm.technician, firm.administrator, second].map(({ personId }) => emailOf(personId));
  expect(mails.map((mail) => mail.to_email).sort()).toEqual((await Promise.all(people)).sort());
  const [toTechnician] = mails.filter(({ subject }) => subject.startsWith("Assigned to you"));
  expect(toTechnician!.body).toContain("2026-12-20");
  expect(toTechnician!.body).toContain(`/${firm.employer.slug}/assignments/${id}\n`);
  const toPay = mails.filter(({ subject }) => subject.startsWith("A sitting fee is due"));
  expect(toPay.map(({ body }) => body).join("\n")).toMatch(/the same whatever the outcome[^]*\/counter\n/);
  const jobs = (await jobsOf("send-mail")).map(({ mailId }) => mailId);
  expect(jobs.sort()).toEqual(mails.map((mail) => mail.id).sort());
});

test("stands in the trail with who assigned, and for which firm", async () => {
  const { id } = await assignRelease(firm.lead, order(), NOW);
  const [fee] = await rowsOf<{ id: string }>("fees");
  const employer = firm.employer.id;
  expect(await trailOf(firm.lead)).toEqual([
    { act: "assignments added", employer, key: id },
    { act: "fees added", employer, key: fee!.id },
  ]);
});

test("a person has one undecided sitting of a module, whichever release", async () => {
  await assignRelease(firm.lead, order(), NOW);
  const newer = await makeRelease(firm, { module: { id: release.moduleId }, number: "1.1", kind: "minor" });
  for (const releaseId of [release.id, newer.id]) {
    const again = assignRelease(firm.lead, order({ releaseId }), NOW);
    await expect(again).rejects.toMatchObject({ name: "ConflictError" });
  }
  expect(await rowsOf("fees")).toHaveLength(1);
});

test("two leads at once make one assignment and one fee", async () => {
  const second = await makeActor(firm.employer, ["lead"]);
  const both = await Promise.allSettled([firm.lead, second].map((lead) => assignRelease(lead, order(), NOW)));
  expect(both.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  expect(await rowsOf("fees")).toHaveLength(1);
});

test("another module, and the same one to another technician, can be assigned beside it", async () => {
  const second = await makeActor(firm.employer, ["technician"]);
  await assignRelease(firm.lead, order(), NOW);
  await assignRelease(firm.lead, order({ technicianId: second.personId }), NOW);
  await assignRelease(firm.lead, order({ releaseId: (await makeRelease(firm)).id }), NOW);
  expect(await rowsOf("fees")).toHaveLength(3);
});

test("after a decision a new sitting can be assigned, with a new fee", async () => {
  const { id } = await assignRelease(firm.lead, order(), NOW);
  const [assignment] = await ownerRows<never>(
    `SELECT id, release_id AS "releaseId", technician_id AS "technicianId" FROM assignments WHERE id = $1`,
    [id],
  );
  await makeDecision(firm, {
    sitting: await makeSitting(firm, { assignment: assignment! }),
    outcome: "not yet competent",
  });
  await assignRelease(firm.lead, order(), NOW);
  expect(await rowsOf("fees")).toHaveLength(2);
});

describe("a kind of check that the technician has met three times in twelve months", () => {
  /** Cases of a sitting of another module, opened on these days at noon. */
  async function opened(days: string[], of = firm) {
    const sitting = await makeSitting(of, { assignment: await makeAssignment(of) });
    for (const [at, day] of days.entries()) {
      await makeCase(of, { sitting, number: at + 1, requestedAt: new Date(`${day}T12:00:00Z`) });
    }
  }

  test("is not assigned, and the lead hears from which day on it can be", async () => {
    await opened(["2026-01-15", "2026-03-01", "2026-06-01"]);
    const before = await everythingStored();
    const refused = assignRelease(firm.lead, order(), NOW);
    await expect(refused).rejects.toMatchObject({
      name: "InvalidError",
      message: expect.stringMatching(/at most 3 cases of one kind.* from 2027-01-15 on/),
      fields: { exposureNote: [expect.stringMatching(/2027-01-15/)] },
    });
    expect(await everythingStored()).toEqual(before);
    await assignRelease(firm.lead, order({ dueOn: "2027-01-20" }), new Date("2027-01-15T00:00:00Z"));
  });

  test("is assigned all the same where the lead says why, and the note is kept", async () => {
    await opened(["2026-01-15", "2026-03-01", "2026-06-01"]);
    const { id } = await assignRelease(firm.lead, order({ exposureNote: "The receiver has changed." }), NOW);
    const [stored] = await ownerRows("SELECT exposure_note FROM assignments WHERE id = $1", [id]);
    expect(stored).toEqual({ exposure_note: "The receiver has changed." });
  });

  test("is assigned while one case is left, by the limit that the release has", async () => {
    await opened(["2026-03-01", "2026-06-01"]);
    const sitting = { days: 30, freshCases: 1, waitHours: 24, exposure: 2 };
    const narrow = await makeRelease(firm, { frontMatter: frontMatter({ sitting }) });
    await expect(assignRelease(firm.lead, order({ releaseId: narrow.id }), NOW)).rejects.toThrow(/at most 2 cases/);
    await assignRelease(firm.lead, order(), NOW);
  });

  test("counts on the days of the firm, and only what was opened there", async () => {
    // Noon UTC on 30 November is 1 December on Kiritimati, UTC+14.
    const east = await makeFirm({ timeZone: "Pacific/Kiritimati" });
    await opened(["2025-11-30", "2026-03-01", "2026-06-01"], east);
    const over = { releaseId: (await makeRelease(east)).id, technicianId: east.technician.personId };
    const assign = (now: string) => assignRelease(east.lead, order(over), new Date(now));
    await expect(assign("2026-11-30T09:59:59Z")).rejects.toThrow(/from 2026-12-01 on/);
    await assign("2026-11-30T10:00:00Z");
    await grantTo(east.technician.personId, firm.employer.id, "technician");
    await assignRelease(firm.lead, order({ technicianId: east.technician.personId }), NOW);
  });
});

describe("refuses", () => {
  const refused = async (over: Parameters<typeof order>[0], field: string, now = NOW, lead = firm.lead) => {
    const before = await everythingStored();
    await expect(assignRelease(lead, order(over), now)).rejects.toMatchObject({
      name: "InvalidError",
      fields: { [field]: [expect.any(String)] },
    });
    expect(await everythingStored()).toEqual(before);
  };

  test("a day that is past, and takes today", async () => {
    await refused({ dueOn: "2026-11-30" }, "dueOn");
    await assignRelease(firm.lead, order({ dueOn: "2026-12-01" }), NOW);
  });

  test("a day that is past where the firm is", async () => {
    // At 10:00 UTC on 1 December it is 2 December on Kiritimati, UTC+14.
    const east = await makeFirm({ timeZone: "Pacific/Kiritimati" });
    const over = { releaseId: (await makeRelease(east)).id, technicianId: east.technician.personId };
    await refused({ ...over, dueOn: "2026-12-01" }, "dueOn", NOW, east.lead);
    await assignRelease(east.lead, order({ ...over, dueOn: "2026-12-02" }), NOW);
  });

  test("anybody who is no technician of the firm today", async () => {
    const former = await makePerson();
    await grantTo(former.id, firm.employer.id, "technician", { endedAt: daysFrom(NOW, -1) });
    const strangers = [firm.lead.personId, other.technician.personId, former.id, "no id"];
    for (const technicianId of strangers) await refused({ technicianId }, "technicianId");
  });

  refusals({
    allowed: "lead",
    setting: () => ({ firm, other, id: release.id }),
    act: (actor, id) => assignRelease(actor, order({ releaseId: id }), NOW),
  });
});

test("a failure at the end leaves no fee, no job and no mail", () =>
  expectNothingLeft("mails", () => assignRelease(firm.lead, order(), NOW)));
