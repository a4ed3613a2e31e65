import { beforeEach, describe, expect, test } from "vitest";
import { openCase } from "@/lib/commands/openCase";
import { db } from "@/lib/db";
import { getDecisionDesk } from "@/lib/queries/getDecisionDesk";
import { getSitting } from "@/lib/queries/getSitting";
import { makeDecision } from "../support/certified";
import { makeAssignment, makeCase, makeHandIn, makeMarkingRecord, makeOpenCase, makeSitting } from "../support/chain";
import { daysFrom, minutesFrom, NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { everythingStored, expectNothingLeft, jobsOf, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let sitting: Awaited<ReturnType<typeof makeSitting>>;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  sitting = await makeSitting(firm);
});
const open = (now = NOW, checkId = "reading") => openCase(firm.technician, { sittingId: sitting.id, checkId }, now);
const refused = async (act: () => Promise<unknown>, name: string, message: RegExp) => {
  const before = await everythingStored();
  await expect(act()).rejects.toMatchObject({ name, message: expect.stringMatching(message) });
  expect(await everythingStored()).toEqual(before);
};

test("asks the worker to draw the first case of a check", async () => {
  const { id } = await open();
  expect(await rowsOf("cases")).toEqual([
    {
      ...{ id, sitting_id: sitting.id, check_id: "reading", kind: "correlator-reading", kind_version: 1 },
      ...{ number: 1, requested_at: NOW },
    },
  ]);
  expect(await jobsOf("build-case")).toEqual([{ caseId: id }]);
});

test("stands in the trail with who asked, and for which firm", async () => {
  const { id } = await open();
  expect(await trailOf(firm.technician)).toEqual([{ act: "cases added", employer: firm.employer.id, key: id }]);
});

test("run twice, also at once, it is one case and one job", async () => {
  const [one, two] = await Promise.all([open(), open()]);
  expect(two).toEqual(one);
  expect(await open()).toEqual(one);
  expect(await rowsOf("cases")).toHaveLength(1);
  expect(await jobsOf("build-case")).toHaveLength(1);
});

test("a case that is open already is the one that is meant", async () => {
  const { id } = await makeOpenCase(firm, { sitting });
  expect(await open()).toEqual({ id });
  expect(await jobsOf("build-case")).toEqual([]);
});

describe("the fee", () => {
  const unpaid = async () => {
    const { id, ...assignment } = await makeAssignment(firm);
    const { releaseId, technicianId, employerId } = assignment;
    return insert<{ id: string }>("sittings", {
      ...{ assignmentId: id, releaseId, technicianId, employerId, terms: "2026-12", lastDay: "2026-12-29" },
    });
  };

  test("while it is open, no case is drawn by this command", async () => {
    const { id: sittingId } = await unpaid();
    const opened = () => openCase(firm.technician, { sittingId, checkId: "reading" }, NOW);
    await refused(opened, "ConflictError", /^The fee .* is open/);
  });

  test("nor by a row that the web process inserts itself", async () => {
    const replacements = { sittingId: (await unpaid()).id };
    const sql = `INSERT INTO cases (sitting_id, check_id, kind, kind_version, number)
      VALUES (:sittingId, 'reading', 'correlator-reading', 1, 1)`;
    await refused(() => db.query(sql, { replacements }), "SequelizeDatabaseError", /^the fee of this sitting is open$/);
  });
});

describe("a fresh case", () => {
  // One fresh case, 24 hours after the hand-in, which was five minutes before NOW.
  const OPENS_AT = daysFrom(minutesFrom(NOW, -5), 1);

  test("waits until the one handed in is marked", async () => {
    await makeHandIn(firm, { sitting });
    await refused(() => open(daysFrom(NOW, 3)), "ConflictError", /being marked/);
  });

  test("opens after the wait that the release asks for, not a millisecond before", async () => {
    await makeMarkingRecord(firm, { sitting, met: false });
    await refused(() => open(new Date(OPENS_AT.getTime() - 1)), "ConflictError", /after the wait/);
    const { id } = await open(OPENS_AT);
    expect(await rowsOf("cases")).toContainEqual(expect.objectContaining({ id, number: 2 }));
    expect(await jobsOf("build-case")).toEqual([{ caseId: id }]);
  });

  test("is refused after the last that the release allows", async () => {
    await makeMarkingRecord(firm, { sitting, met: false });
    const second = await makeHandIn(firm, { case: await makeOpenCase(firm, { case: await secondCase() }) });
    await makeMarkingRecord(firm, { case: second, met: false });
    await refused(() => open(daysFrom(NOW, 5)), "ConflictError", /no further case/);
  });

  test("is refused of a check that is met", async () => {
    await makeMarkingRecord(firm, { sitting });
    await refused(() => open(daysFrom(NOW, 3)), "ConflictError", /is met/);
  });

  describe("after three of its kind in twelve months", () => {
    const DAYS = ["2026-03-01", "2026-06-01"].map((day) => new Date(`${day}T12:00:00Z`));
    const earlier = async () => {
      const before = await makeSitting(firm);
      for (const [at, requestedAt] of DAYS.entries()) {
        await makeCase(firm, { sitting: before, number: at + 1, requestedAt });
      }
    };
    const shown = async (now: Date) => (await getSitting(firm.technician, sitting.id, now))!.checks[0]!.next;

    test("is refused, with the day on which one can be opened, and the page says so", async () => {
      await earlier();
      await makeMarkingRecord(firm, { sitting, met: false });
      const reason = /at most 3 cases of one kind\. The next can be opened from 2027-03-01 on/;
      await refused(() => open(OPENS_AT), "ConflictError", reason);
      expect(await shown(OPENS_AT)).toEqual({ state: "closed", reason: expect.stringMatching(reason) });
    });

    test("opens where the lead has lifted the limit for this sitting", async () => {
      await earlier();
      sitting = await makeSitting(firm, { assignment: await makeAssignment(firm, { exposureNote: "New receiver." }) });
      await makeMarkingRecord(firm, { sitting, met: false });
      expect(await shown(OPENS_AT)).toEqual({ state: "available", number: 2 });
      await open(OPENS_AT);
      expect((await getDecisionDesk(firm.decider, sitting.id, NOW))!.exposureNote).toBe("New receiver.");
    });

    test("the first case of a sitting opens all the same: it is paid for", async () => {
      await earlier();
      await makeCase(firm, { sitting: await makeSitting(firm) });
      expect(await shown(NOW)).toEqual({ state: "available", number: 1 });
      await open();
    });
  });

  const secondCase = () => makeCase(firm, { sitting, number: 2 });
});

describe("refuses", () => {
  test("the day after the last one where the firm is", async () => {
    // The last day of this sitting is 29 December, London time is UTC in winter.
    await refused(() => open(new Date("2026-12-30T00:00:00Z")), "ConflictError", /last day .* 2026-12-29/);
    await open(new Date("2026-12-29T23:59:59Z"));
  });

  test("a sitting that is decided", async () => {
    await makeDecision(firm, { sitting, outcome: "not yet competent" });
    await refused(() => open(daysFrom(NOW, 3)), "ConflictError", /is decided/);
  });

  test("a check that the release does not have", () =>
    refused(() => open(NOW, "nothing"), "NotFoundError", /no such check/));

  test("another technician of the firm", async () => {
    const second = await makeActor(firm.employer, ["technician"]);
    const opened = () => openCase(second, { sittingId: sitting.id, checkId: "reading" }, NOW);
    await refused(opened, "ForbiddenError", /may not/);
  });

  refusals({
    allowed: "technician",
    setting: () => ({ firm, other, id: sitting.id }),
    act: (actor, id) => openCase(actor, { sittingId: id, checkId: "reading" }, NOW),
  });
});

test("a failure at the end leaves neither case nor job", () => expectNothingLeft("cases", () => open()));
