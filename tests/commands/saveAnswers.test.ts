import { beforeEach, describe, expect, test } from "vitest";
import { saveAnswers } from "@/lib/commands/saveAnswers";
import { makeCase, makeHandIn, makeOpenCase } from "../support/chain";
import { minutesFrom, NOW } from "../support/clock";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { everythingStored, expectNothingLeft, rowsOf } from "../support/written";
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
const save = (lag: string, revision: number, now = NOW, id = caseId) =>
  saveAnswers(firm.technician, { caseId: id, answers: { "peak.lag": lag }, revision }, now);
const kept = async () =>
  (await rowsOf<{ answers: object; revision: number }>("case_answers")).map(({ answers, revision }) => ({
    ...answers,
    revision,
  }));

test("keeps the answers as typed", async () => {
  expect(await save(" 88,75 chip ", 1)).toEqual({ savedAt: NOW.toISOString() });
  expect(await rowsOf("case_answers")).toEqual([
    { case_id: caseId, answers: { "peak.lag": " 88,75 chip " }, revision: 1, saved_at: NOW },
  ]);
});

test("a newer revision takes the place of an older one", async () => {
  await save("88 chip", 1);
  await save("89 chip", 2, minutesFrom(NOW, 1));
  expect(await kept()).toEqual([{ "peak.lag": "89 chip", revision: 2 }]);
});

test("an older one that arrives late, and the same one again, change nothing", async () => {
  await save("89 chip", 5);
  await save("88 chip", 4, minutesFrom(NOW, 1));
  await save("87 chip", 5, minutesFrom(NOW, 1));
  expect(await rowsOf("case_answers")).toMatchObject([{ answers: { "peak.lag": "89 chip" }, saved_at: NOW }]);
});

test("sent all at once, the newest stays", async () => {
  await Promise.all([3, 1, 5, 2, 4].map((revision) => save(`${revision} chip`, revision)));
  expect(await kept()).toEqual([{ "peak.lag": "5 chip", revision: 5 }]);
});

test("an autosave is no entry of the trail", async () => {
  const before = await rowsOf("trail_entries");
  await save("88 chip", 1);
  expect(await rowsOf("trail_entries")).toEqual(before);
});

test("answers on their way when the clock ends are kept, later ones are not", async () => {
  await save("88 chip", 1, LAST_MOMENT);
  const late = save("89 chip", 2, new Date(LAST_MOMENT.getTime() + 1));
  await expect(late).rejects.toMatchObject({ name: "ConflictError", publicMessage: "The time of this case is over." });
  expect(await kept()).toEqual([{ "peak.lag": "88 chip", revision: 1 }]);
});

describe("refuses", () => {
  test("a case that is not drawn yet, and one that is handed in", async () => {
    const { id: building } = await makeCase(firm);
    const { id: handedIn } = await makeHandIn(firm);
    const before = await everythingStored();
    await expect(save("88 chip", 1, NOW, building)).rejects.toThrow("This case is not drawn yet.");
    await expect(save("88 chip", 1, NOW, handedIn)).rejects.toThrow("This case is handed in.");
    expect(await everythingStored()).toEqual(before);
  });

  test("another technician of the firm", async () => {
    const second = await makeActor(firm.employer, ["technician"]);
    const saved = saveAnswers(second, { caseId, answers: {}, revision: 1 }, NOW);
    await expect(saved).rejects.toMatchObject({ name: "ForbiddenError" });
    expect(await kept()).toEqual([]);
  });

  refusals({
    allowed: "technician",
    setting: () => ({ firm, other, id: caseId }),
    act: (actor, id) => saveAnswers(actor, { caseId: id, answers: {}, revision: 1 }, NOW),
  });
});

test("a failure at the end leaves the answers before it", async () => {
  await save("88 chip", 1);
  await expectNothingLeft("case_answers", () => save("89 chip", 2));
});
