import { beforeEach, expect, test } from "vitest";
import { closeSittings } from "@/lib/commands/closeSittings";
import { makeDecision } from "../support/certified";
import {
  makeAssignment,
  makeHandIn,
  makeMarkingRecord,
  makeOpenCase,
  makeRelease,
  makeSitting,
} from "../support/chain";
import { NOW } from "../support/clock";
import { grantTo, makeFirm, type Firm } from "../support/factories";
import { insert, ownerRows } from "../support/owner";
import { checkPlan, frontMatter } from "../support/samples";
import { PUBLIC_ORIGIN, queued, rowsOf } from "./tools";

// The firm is in London: in December its midnight is that of universal time.
const LAST_DAY = "2026-12-29";
const ON_THE_LAST_DAY = new Date("2026-12-29T23:59:59Z");
const AFTER = new Date("2026-12-30T00:00:00Z");

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});

const close = (now = AFTER) => closeSittings(PUBLIC_ORIGIN, now);
const closings = () => rowsOf<{ sitting_id: string; unfinished: boolean; closed_at: Date }>("closings");
const mails = () => ownerRows<{ to_email: string; subject: string; body: string }>("SELECT * FROM mails");

async function sittingOf(checks: string[], freshCases = 0) {
  const release = await makeRelease(firm, {
    checks: checks.map((id) => checkPlan({ id })),
    frontMatter: frontMatter({
      sitting: { days: 30, freshCases, waitHours: 24 },
      require: { all: checks, some: null },
    }),
  });
  return makeSitting(firm, { assignment: await makeAssignment(firm, { release }), lastDay: LAST_DAY });
}

test("a sitting with a check unmarked goes to the deciders once its last day has passed, not before", async () => {
  const sitting = await sittingOf(["reading", "delay"]);
  await makeMarkingRecord(firm, { sitting });
  expect(await close(ON_THE_LAST_DAY)).toBe(0);
  expect(await close()).toBe(1);
  expect(await closings()).toMatchObject([{ sitting_id: sitting.id, unfinished: true, closed_at: AFTER }]);
  const [mail, ...more] = await mails();
  expect(more).toEqual([]);
  const [decider] = await ownerRows<{ email: string }>("SELECT email FROM people WHERE id = $1", [
    firm.decider.personId,
  ]);
  expect(mail!.to_email).toBe(decider!.email);
  expect(mail!.body).toContain("Its last day, 2026-12-29, has passed; 1 of 2 checks have a marking record.");
  expect(mail!.body).toContain(`${PUBLIC_ORIGIN}/${firm.employer.slug}/queue/${sitting.id}`);
  expect(await queued("send-mail")).toHaveLength(1);
});

test("so does one with a fresh case unused, and one in which nothing was opened", async () => {
  await makeMarkingRecord(firm, { sitting: await sittingOf(["reading"], 1), met: false });
  await sittingOf(["reading"]);
  expect(await close()).toBe(2);
  expect((await closings()).map(({ unfinished }) => unfinished)).toEqual([true, true]);
  expect(await mails()).toHaveLength(2);
});

test("one that was complete was told when it was marked, and is not told again", async () => {
  await makeMarkingRecord(firm, { sitting: await sittingOf(["reading"]) });
  expect(await close()).toBe(1);
  expect(await closings()).toMatchObject([{ unfinished: false }]);
  expect(await mails()).toEqual([]);
});

test.each([
  ["open", (sitting: { id: string }) => makeOpenCase(firm, { sitting })],
  ["being marked", (sitting: { id: string }) => makeHandIn(firm, { sitting })],
])("a case that is %s when the day ends is waited for", async (_state, make) => {
  const sitting = await sittingOf(["reading", "delay"]);
  const { id: caseId } = await make(sitting);
  expect(await close()).toBe(0);
  const handedIn = await ownerRows("SELECT 1 FROM hand_ins WHERE case_id = $1", [caseId]);
  const asked = { id: caseId } as Awaited<ReturnType<typeof makeOpenCase>>;
  if (handedIn.length === 0) await makeHandIn(firm, { case: asked });
  await makeMarkingRecord(firm, { case: asked });
  expect(await close()).toBe(1);
  expect(await mails()).toHaveLength(1);
});

test("run twice, also at once, it is closed once and told once", async () => {
  await sittingOf(["reading"]);
  expect((await Promise.all([close(), close()])).sort()).toEqual([0, 1]);
  expect(await close()).toBe(0);
  expect(await closings()).toHaveLength(1);
  expect(await mails()).toHaveLength(1);
});

test("killed between two sittings, the next run does what is left", async () => {
  const [first, second] = [await sittingOf(["reading"]), await sittingOf(["reading"])];
  const [kept] = [first, second].sort((a, b) => (a.id < b.id ? -1 : 1));
  await insert("closings", { sittingId: kept!.id, unfinished: true, closedAt: AFTER });
  expect(await close()).toBe(1);
  expect(await closings()).toHaveLength(2);
});

test("killed with the closing written and the mails not, nothing is kept and the next run does it all", async () => {
  await sittingOf(["reading"]);
  await ownerRows("ALTER TABLE mails ADD CONSTRAINT killed_here CHECK (subject = '')");
  try {
    await expect(close()).rejects.toThrow("killed_here");
    expect(await closings()).toEqual([]);
  } finally {
    await ownerRows("ALTER TABLE mails DROP CONSTRAINT killed_here");
  }
  expect(await close()).toBe(1);
  expect(await mails()).toHaveLength(1);
});

test("a decided sitting stays as it is, and a barred decider hears nothing", async () => {
  await makeDecision(firm, { sitting: await sittingOf(["reading"]) });
  expect(await close()).toBe(0);
  await grantTo(firm.lead.personId, firm.employer.id, "decider");
  await sittingOf(["reading"]);
  await close();
  expect(await mails()).toHaveLength(1);
});

// Time zone database: Auckland keeps UTC+13 in December, Honolulu UTC-10 all the year.
test.each([
  ["Pacific/Auckland", "2026-12-29T10:59:59Z", "2026-12-29T11:00:00Z"],
  ["Pacific/Honolulu", "2026-12-30T09:59:59Z", "2026-12-30T10:00:00Z"],
])("the last day ends with the employer's own midnight in %s", async (timeZone, before, after) => {
  firm = await makeFirm({ timeZone });
  await sittingOf(["reading"]);
  expect(await close(new Date(before))).toBe(0);
  expect(await close(new Date(after))).toBe(1);
});

test("of a sitting whose last day is ahead nothing is closed", async () => {
  await makeSitting(firm);
  expect(await close(NOW)).toBe(0);
});
