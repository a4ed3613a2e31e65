import { beforeEach, describe, expect, test } from "vitest";
import { answerQuestion } from "@/lib/commands/answerQuestion";
import { askQuestion } from "@/lib/commands/askQuestion";
import { getMarkingRecord } from "@/lib/queries/getMarkingRecord";
import { listQuestions } from "@/lib/queries/listQuestions";
import { makeMarkingRecord } from "../support/chain";
import { grantTo, makeActor, makeFirm, type Firm } from "../support/factories";
import { expectNothingLeft, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let caseId: string;
let questionId: string;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  const record = await makeMarkingRecord(firm, { met: false });
  caseId = record.caseId;
  const asked = { markingRecordId: record.id, quantity: "lag", words: "Why not this peak?" };
  questionId = (await askQuestion(firm.technician, asked)).id;
});
const answer = (words = "It is a side lobe.", actor = firm.assessor, id = questionId) =>
  answerQuestion(actor, { questionId: id, words });

test("a question waits in the queue until it is answered, then stands in the record with its answer", async () => {
  expect(await listQuestions(firm.assessor)).toMatchObject([
    { id: questionId, caseId, quantity: "Lag of the highest cell", words: "Why not this peak?" },
  ]);
  const { id } = await answer();
  expect(await listQuestions(firm.assessor)).toEqual([]);
  const record = await getMarkingRecord(firm.technician, caseId);
  expect(record?.questions).toMatchObject([{ answer: "It is a side lobe.", answeredBy: firm.assessor.name }]);
  const employer = firm.employer.id;
  expect(await trailOf(firm.assessor)).toEqual([{ act: "question_answers added", employer, key: id }]);
});

test("the technician is mailed question and answer", async () => {
  await answer();
  const [mail] = await rowsOf<{ to_email: string; subject: string; body: string }>("mails");
  expect(mail?.subject).toBe("Answered: Lag of the highest cell");
  for (const said of ["Why not this peak?", "It is a side lobe.", `/records/${caseId}`])
    expect(mail?.body).toContain(said);
});

test("pressed twice, also at once, it is answered once", async () => {
  const [one, two] = await Promise.all([answer(), answer()]);
  expect(two).toEqual(one);
  expect(await rowsOf("question_answers")).toHaveLength(1);
  expect(await rowsOf("mails")).toHaveLength(1);
});

describe("refuses", () => {
  test("a second answer", async () => {
    await answer();
    await expect(answer("Or not.", await makeActor(firm.employer, ["assessor"]))).rejects.toThrow(/answered already/);
  });

  test("whoever asked, with whatever role", async () => {
    await grantTo(firm.technician.personId, firm.employer.id, "assessor");
    const both = { ...firm.technician, roles: ["technician" as const, "assessor" as const] };
    await expect(answer("Because.", both)).rejects.toMatchObject({ name: "ForbiddenError" });
  });

  refusals({
    allowed: "assessor",
    setting: () => ({ firm, other, id: questionId }),
    act: (actor, id) => answer("It is a side lobe.", actor, id),
  });
});

test("a failure at the end leaves nothing", () => expectNothingLeft("question_answers", () => answer()));
