import { beforeEach, describe, expect, test } from "vitest";
import { askQuestion } from "@/lib/commands/askQuestion";
import { makeMarkingRecord } from "../support/chain";
import { makeActor, makeFirm, type Firm } from "../support/factories";
import { expectNothingLeft, rowsOf, trailOf } from "../support/written";
import { refusals } from "./refusals";

let firm: Firm;
let other: Firm;
let markingRecordId: string;
beforeEach(async () => {
  [firm, other] = [await makeFirm(), await makeFirm()];
  markingRecordId = (await makeMarkingRecord(firm, { met: false })).id;
});
const asked = (over: object = {}) => ({ markingRecordId, quantity: "lag", words: "Why not this peak?", ...over });

test("keeps the question with the quantity it is about", async () => {
  const { id } = await askQuestion(firm.technician, asked());
  expect(await rowsOf("questions")).toMatchObject([
    {
      ...{ id, marking_record_id: markingRecordId, quantity: "lag", words: "Why not this peak?" },
      asked_by: firm.technician.personId,
    },
  ]);
  const employer = firm.employer.id;
  expect(await trailOf(firm.technician)).toEqual([{ act: "questions added", employer, key: id }]);
});

test("run twice, also at once, it is asked once; another question is another one", async () => {
  const [one, two] = await Promise.all([1, 2].map(() => askQuestion(firm.technician, asked())));
  expect(two).toEqual(one);
  await askQuestion(firm.technician, asked({ words: "And the other one?" }));
  expect(await rowsOf("questions")).toHaveLength(2);
});

describe("refuses", () => {
  test("a quantity that the record does not have", async () => {
    const question = askQuestion(firm.technician, asked({ quantity: "doppler" }));
    await expect(question).rejects.toMatchObject({ name: "InvalidError", fields: { quantity: [expect.any(String)] } });
    expect(await rowsOf("questions")).toEqual([]);
  });

  test("another technician of the firm", async () => {
    const second = await makeActor(firm.employer, ["technician"]);
    await expect(askQuestion(second, asked())).rejects.toMatchObject({ name: "ForbiddenError" });
    expect(await rowsOf("questions")).toEqual([]);
  });

  refusals({
    allowed: "technician",
    setting: () => ({ firm, other, id: markingRecordId }),
    act: (actor, id) => askQuestion(actor, asked({ markingRecordId: id })),
  });
});

test("a failure at the end leaves no question", () =>
  expectNothingLeft("questions", () => askQuestion(firm.technician, asked())));
