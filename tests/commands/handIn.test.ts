import { beforeEach, describe, expect, test } from "vitest";
import { handIn } from "@/lib/commands/handIn";
import { saveAnswers } from "@/lib/commands/saveAnswers";
import { makeCase, makeOpenCase, makeWrittenCase } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { everythingStored, expectNothingLeft, jobsOf, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

// The clock of this case ends ten minutes after NOW; what is on its way then has half a minute more.
const LAST_MOMENT = minutesFrom(NOW, 10.5);

let firm: Firm;
let other: Firm;
let caseId: string;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  caseId = (await makeOpenCase(firm)).id;
});
const answers = { "peak.lag": "88,75 chip" };
const hand = (now = NOW, over: object = {}) => handIn(firm.technician, { caseId, answers, words: "", ...over }, now);

test("keeps answers and words as typed and has them marked", async () => {
  expect(await hand(NOW, { words: "The trace is noisy." })).toEqual({ handedInAt: NOW.toISOString() });
  expect(await rowsOf("hand_ins")).toEqual([
    { case_id: caseId, answers, words: "The trace is noisy.", by_clock: false, handed_in_at: NOW },
  ]);
  expect(await jobsOf("mark-case")).toEqual([{ caseId }]);
});

test("what is handed in counts, not what was saved before", async () => {
  await saveAnswers(firm.technician, { caseId, answers: { "peak.lag": "1 chip" }, revision: 9 }, NOW);
  await hand();
  expect(await rowsOf("hand_ins")).toMatchObject([{ answers }]);
});

test("stands in the trail with who handed in, and for which firm", async () => {
  await hand();
  const employer = firm.employer.id;
  expect(await trailOf(firm.technician)).toEqual([{ act: "hand_ins added", employer, key: caseId }]);
});

test("run twice, the first hand-in stays", async () => {
  const first = await hand();
  expect(await hand(minutesFrom(NOW, 1), { answers: { "peak.lag": "1 chip" } })).toEqual(first);
  expect(await rowsOf("hand_ins")).toMatchObject([{ answers, handed_in_at: NOW }]);
  expect(await jobsOf("mark-case")).toHaveLength(1);
});

test("two at once are one hand-in and one marking", async () => {
  const [one, two] = await Promise.all([hand(), hand()]);
  expect(one).toEqual(two);
  expect(await jobsOf("mark-case")).toHaveLength(1);
});

test("what is on its way when the clock ends is taken, a later hand-in is not", async () => {
  const before = await everythingStored();
  const late = hand(new Date(LAST_MOMENT.getTime() + 1));
  await expect(late).rejects.toMatchObject({
    name: "ConflictError",
    publicMessage: expect.stringMatching(/by the clock/),
  });
  expect(await everythingStored()).toEqual(before);
  expect(await hand(LAST_MOMENT)).toEqual({ handedInAt: LAST_MOMENT.toISOString() });
});

describe("refuses", () => {
  test("a case that is not drawn yet", async () => {
    const { id } = await makeCase(firm);
    await expect(hand(NOW, { caseId: id })).rejects.toThrow("This case is not drawn yet.");
  });

  test("another technician of the firm", async () => {
    const second = await makeActor(firm.employer, ["technician"]);
    const handed = handIn(second, { caseId, answers, words: "" }, NOW);
    await expect(handed).rejects.toMatchObject({ name: "ForbiddenError" });
    expect(await rowsOf("hand_ins")).toEqual([]);
  });

  refusals({
    allowed: "technician",
    setting: () => ({ firm, other, id: caseId }),
    act: (actor, id) => handIn(actor, { caseId: id, answers, words: "" }, NOW),
  });
});

test("a failure at the end leaves neither hand-in nor job", () => expectNothingLeft("hand_ins", () => hand()));

test("a written account goes to the assessors, who hear of it once, and not to the worker", async () => {
  const { id } = await makeWrittenCase(firm);
  const written = { caseId: id, answers: { "account.seen": "Two masts." }, words: "" };
  await handIn(firm.technician, written, NOW);
  await handIn(firm.technician, written, NOW);
  expect(await jobsOf("mark-case")).toEqual([]);
  const mails = await rowsOf<{ subject: string; body: string }>("mails");
  expect(mails.map(({ subject }) => subject)).toEqual([`To be judged: ${firm.technician.name}, What you saw`]);
  expect(mails[0]!.body).toContain(`/queue/judging/${id}`);
});
