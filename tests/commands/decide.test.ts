import { createHash } from "node:crypto";
import { beforeEach, describe, expect, test } from "vitest";
import { decide } from "@/lib/commands/decide";
import type { Outcome } from "@/models/Decision";
import { makeHandIn, makeMarkingRecord, makeRelease, makeSitting, makeAssignment } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { ownerRows } from "../support/owner";
import { checkPlan, frontMatter } from "../support/samples";
import { everythingStored, expectNothingLeft, jobsOf, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let sitting: Awaited<ReturnType<typeof makeSitting>>;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  sitting = await makeSitting(firm);
});
const signed = (outcome: Outcome = "competent") => ({
  ...{ sittingId: sitting.id, outcome, reason: "Read with care.", declaration: "I have no interest in the outcome." },
});
const decided = (outcome?: Outcome) => decide(firm.decider, signed(outcome), NOW);
const refused = async (act: () => Promise<unknown>, name: string, message: RegExp) => {
  const before = await everythingStored();
  await expect(act()).rejects.toMatchObject({ name, message: expect.stringMatching(message) });
  expect(await everythingStored()).toEqual(before);
};

test("competent: the decision names its evidence, and the certificate is asked for", async () => {
  const record = await makeMarkingRecord(firm, { sitting });
  const { id } = await decided();
  type Stored = { evidence: object[]; evidence_sha256: string };
  const [decision] = await rowsOf<Stored>("decisions");
  const sha256 = (
    await ownerRows<{ hash: string }>("SELECT row_sha256(to_jsonb(m)) AS hash FROM marking_records m")
  )[0];
  const exhibit = { caseId: record.caseId, checkId: "reading", markingRecordId: record.id, met: true };
  expect(decision).toMatchObject({
    ...{ id, sitting_id: sitting.id, outcome: "competent", reason: "Read with care.", outside_line: true },
    ...{ declaration: "I have no interest in the outcome.", decided_by: firm.decider.personId, decided_at: NOW },
    // When the password was given, a minute before NOW.
    signed_afresh_at: minutesFrom(NOW, -1),
    evidence: [{ ...exhibit, sha256: sha256!.hash }],
  });
  // The evidence's canonical JSON, written by hand.
  const { caseId, markingRecordId } = exhibit;
  const written = `[{"caseId":"${caseId}","checkId":"reading","markingRecordId":"${markingRecordId}","met":true,"sha256":"${sha256!.hash}"}]`;
  expect(decision!.evidence_sha256).toBe(createHash("sha256").update(written).digest("hex"));
  expect(await jobsOf("issue-certificate")).toEqual([{ decisionId: id }]);
  expect(await rowsOf("mails")).toEqual([]);
});

test("not yet competent: the technician is told why, and no certificate is asked for", async () => {
  await makeMarkingRecord(firm, { sitting, met: false });
  await decided("not yet competent");
  const [mail] = await rowsOf<{ id: string; subject: string; body: string }>("mails");
  expect(mail!.subject).toMatch(/^Not yet competent/);
  expect(mail!.body).toMatch(/Reasons\nRead with care\.\n[^]*appeal/);
  expect(await jobsOf("send-mail")).toEqual([{ mailId: mail!.id }]);
  expect(await jobsOf("issue-certificate")).toEqual([]);
});

test("stands in the trail with who decided, and for which firm", async () => {
  await makeMarkingRecord(firm, { sitting });
  const { id } = await decided();
  expect(await trailOf(firm.decider)).toEqual([{ act: "decisions added", employer: firm.employer.id, key: id }]);
});

test("says whether the decider stands outside the line", async () => {
  await makeMarkingRecord(firm, { sitting });
  const inside = await makeActor(firm.employer, ["decider"], { passwordAt: NOW });
  await decide(inside, signed(), NOW);
  expect(await rowsOf("decisions")).toMatchObject([{ outside_line: false }]);
});

test("there is one decision, also when two deciders sign at once", async () => {
  await makeMarkingRecord(firm, { sitting });
  const second = await makeActor(firm.employer, ["decider"], { passwordAt: NOW });
  const both = await Promise.allSettled([firm.decider, second].map((actor) => decide(actor, signed(), NOW)));
  expect(both.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  await refused(() => decided("not yet competent"), "ConflictError", /decided already/);
  expect(await jobsOf("issue-certificate")).toHaveLength(1);
});

describe("signing in afresh", () => {
  const AFRESH_MS = 5 * 60_000;
  const given = (passwordAt: Date | null) => decide({ ...firm.decider, passwordAt }, signed(), NOW);

  test("is needed", async () => {
    await makeMarkingRecord(firm, { sitting });
    await refused(() => given(null), "SignInAfreshError", /password again/);
    await refused(() => given(new Date(NOW.getTime() - AFRESH_MS - 1)), "SignInAfreshError", /password again/);
  });

  test("holds for five minutes", async () => {
    await makeMarkingRecord(firm, { sitting });
    await given(new Date(NOW.getTime() - AFRESH_MS));
    expect(await rowsOf("decisions")).toHaveLength(1);
  });
});

describe("refuses", () => {
  test("competent where the requirement is not met; not yet is possible", async () => {
    await makeMarkingRecord(firm, { sitting, met: false });
    await refused(() => decided(), "ConflictError", /requirement is not met/);
    await decided("not yet competent");
  });

  test("a sitting with a case that is not marked, whatever the outcome", async () => {
    await makeHandIn(firm, { sitting });
    for (const outcome of ["competent", "not yet competent"] as const) {
      await refused(() => decided(outcome), "ConflictError", /still open or being marked/);
    }
  });

  test("a check without a record until the last day has passed where the firm is", async () => {
    const checks = [checkPlan(), checkPlan({ id: "plan" })];
    const require = { all: ["reading", "plan"], some: null };
    const release = await makeRelease(firm, { checks, frontMatter: frontMatter({ require }) });
    const assignment = await makeAssignment(firm, { release });
    sitting = await makeSitting(firm, { assignment, lastDay: "2026-12-29" });
    await makeMarkingRecord(firm, { sitting });
    const at = (now: Date, outcome: Outcome) => decide({ ...firm.decider, passwordAt: now }, signed(outcome), now);
    const [lastSecond, nextDay] = [new Date("2026-12-29T23:59:59Z"), new Date("2026-12-30T00:00:00Z")];
    await refused(() => at(lastSecond, "not yet competent"), "ConflictError", /Not every check/);
    await refused(() => at(nextDay, "competent"), "ConflictError", /requirement is not met/);
    await at(nextDay, "not yet competent");
  });

  test("a sitting without any case", () => refused(() => decided(), "ConflictError", /Not every check/));

  refusals({
    allowed: "decider",
    setting: () => ({ firm, other, id: sitting.id }),
    act: (actor, id) => decide(actor, { ...signed("not yet competent"), sittingId: id }, NOW),
  });
});

test.each<[Outcome, boolean]>([
  ["competent", true],
  ["not yet competent", false],
])("a failure at the end leaves no decision of %s, no job and no mail", async (outcome, met) => {
  await makeMarkingRecord(firm, { sitting, met });
  await expectNothingLeft("decisions", () => decided(outcome));
});
