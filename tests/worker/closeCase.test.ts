import { beforeEach, expect, test } from "vitest";
import { closeCase } from "@/lib/commands/closeCase";
import { makeHandIn, makeOpenCase, makeWrittenCase } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeFirm, type Firm } from "../support/factories";
import { insert } from "../support/owner";
import { PUBLIC_ORIGIN, queued, rowsOf } from "./tools";

// Open for ten minutes from NOW on; answers on their way have half a minute more.
const ENDS_AT = minutesFrom(NOW, 10);
const CLOSES_AT = minutesFrom(NOW, 10.5);

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});

test("hands in what was saved, as of the end of the clock, and has it marked", async () => {
  const { id: caseId } = await makeOpenCase(firm);
  await insert("case_answers", { caseId, answers: { "peak.lag": "88.7 chip" }, revision: 4, savedAt: NOW });
  expect(await closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT)).toBe("closed");
  expect(await rowsOf("hand_ins")).toEqual([
    { case_id: caseId, answers: { "peak.lag": "88.7 chip" }, words: "", by_clock: true, handed_in_at: ENDS_AT },
  ]);
  expect(await queued("mark-case")).toMatchObject([{ data: { caseId } }]);
});

test("hands in nothing where nothing was saved", async () => {
  const { id: caseId } = await makeOpenCase(firm);
  await closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT);
  expect(await rowsOf("hand_ins")).toMatchObject([{ answers: {}, by_clock: true }]);
});

test("leaves the technician's own hand-in alone", async () => {
  const { id: caseId } = await makeHandIn(firm);
  expect(await closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT)).toBe("was handed in");
  expect(await rowsOf("hand_ins")).toMatchObject([{ by_clock: false }]);
  expect(await queued("mark-case")).toEqual([]);
});

test("run before the time, it comes back when the clock has run out", async () => {
  const { id: caseId } = await makeOpenCase(firm);
  expect(await closeCase(caseId, PUBLIC_ORIGIN, minutesFrom(NOW, 10.4))).toBe("still open");
  expect(await rowsOf("hand_ins")).toEqual([]);
  expect(await queued("close-case")).toEqual([{ data: { caseId }, startAfter: CLOSES_AT }]);
});

test("run twice, also at once, there is one hand-in and one marking", async () => {
  const { id: caseId } = await makeOpenCase(firm);
  const outcomes = await Promise.all([
    closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT),
    closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT),
  ]);
  expect(outcomes.sort()).toEqual(["closed", "was handed in"]);
  expect(await closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT)).toBe("was handed in");
  expect(await queued("mark-case")).toHaveLength(1);
});

test("a written account goes to the assessors instead, who hear of it once", async () => {
  const { id: caseId } = await makeWrittenCase(firm);
  expect(await closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT)).toBe("closed");
  expect(await closeCase(caseId, PUBLIC_ORIGIN, CLOSES_AT)).toBe("was handed in");
  expect(await queued("mark-case")).toEqual([]);
  const mails = await rowsOf<{ subject: string; body: string }>("mails");
  expect(mails.map(({ subject }) => subject)).toEqual([expect.stringMatching(/^To be judged: .*, What you saw$/)]);
  expect(mails[0]!.body).toContain(`${PUBLIC_ORIGIN}/${firm.employer.slug}/queue/judging/${caseId}`);
});
