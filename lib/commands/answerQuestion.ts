import "server-only";
import { webEnv } from "@/lib/env";
import { ConflictError, NotFoundError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { Employer, MarkingRecord, Person, Question, QuestionAnswer } from "@/models";
import { lockOwnCase, requireId } from "./lockOwn";
import { transact } from "./transact";
import { writeMail } from "./writeMail";

type Answered = { questionId: string; words: string };

/** An assessor answers a questioned quantity: it stands in the record for good, and the technician is mailed. */
export const answerQuestion = (actor: Actor, { questionId, words }: Answered) =>
  transact(actor, async (transaction) => {
    requireId(questionId, "question");
    const question = await Question.findByPk(questionId, { transaction });
    const record = question && (await MarkingRecord.findByPk(question.markingRecordId, { transaction }));
    if (!question || !record) throw new NotFoundError("question");
    const { sitting } = await lockOwnCase(actor, record.caseId, transaction, "question");
    authorize(can.answerQuestion(actor, sitting), "answer this question");
    const earlier = await QuestionAnswer.findOne({ where: { questionId }, transaction });
    // A second press of the same key answers nothing new.
    if (earlier?.answeredBy === actor.personId && earlier.words === words) return { id: earlier.id };
    if (earlier) throw new ConflictError("This question is answered already.");
    const { id } = await QuestionAnswer.create({ questionId, words, answeredBy: actor.personId }, { transaction });
    const technician = await Person.findByPk(question.askedBy, { transaction, rejectOnEmpty: true });
    const employer = await Employer.findByPk(sitting.employerId, { transaction, rejectOnEmpty: true });
    const label = record.quantities.find(({ of }) => of === question.quantity)?.label ?? question.quantity;
    const body = `Your question about "${label}" (sitting S-${sitting.number}) is answered.\n\nYou asked\n${question.words}\n\nAnswer by ${actor.name}\n${words}\n\n${webEnv().PUBLIC_ORIGIN}/${employer.slug}/records/${record.caseId}\n`;
    await writeMail({ to: technician.email, subject: `Answered: ${label}`, body }, transaction);
    return { id };
  });
