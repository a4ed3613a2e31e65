import "server-only";
import { InvalidError, NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { MarkingRecord, Question } from "@/models";
import { lockOwnCase, requireId } from "./lockOwn";
import { transact } from "./transact";

type Asked = { markingRecordId: string; quantity: string; words: string };

/** The technician questions a quantity of the own marking record; whoever decides reads it first. */
export const askQuestion = (actor: Actor, { markingRecordId, quantity, words }: Asked) =>
  transact(actor, async (transaction) => {
    requireId(markingRecordId, "marking record");
    const record = await MarkingRecord.findByPk(markingRecordId, { transaction });
    if (!record) throw new NotFoundError("marking record");
    const { sitting } = await lockOwnCase(actor, record.caseId, transaction, "marking record");
    authorize(can.sit(actor, sitting), "question this record");
    if (!record.quantities.some(({ of }) => of === quantity)) {
      throw new InvalidError("Choose a quantity of this record.", { quantity: ["Choose a quantity of this record."] });
    }
    // A second press of the same key asks nothing new.
    const asked = { markingRecordId, quantity, words, askedBy: actor.personId };
    const earlier = await Question.findOne({ where: asked, transaction });
    const question = earlier ?? (await Question.create(asked, { transaction }));
    return { id: question.id };
  });
