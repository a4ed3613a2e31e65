import type { FormAction } from "@/components/ui/actionResult";
import { formatInstant } from "@/components/ui/formatDay";
import type { MarkingRecordView } from "@/lib/queries/getMarkingRecord";
import { AnswerQuestion } from "./AnswerQuestion";

type QuestionsProps = { employer: string; record: MarkingRecordView; answer: FormAction };

/** What was asked about this record and what was answered; an assessor answers here. */
export function Questions({ employer, record, answer }: QuestionsProps) {
  return record.questions.map((question) => (
    <div key={question.id} className="mt-3 border-b-hair border-rule pb-3 text-dense">
      <p>
        <strong className="font-semibold">
          {record.quantities.find(({ of }) => of === question.quantity)?.label ?? question.quantity}:
        </strong>{" "}
        {question.words} <span className="text-ink-2">{formatInstant(question.askedAt)}</span>
      </p>
      {question.answer && (
        <p className="mt-2 whitespace-pre-line">
          <strong className="font-semibold">Answer, {question.answeredBy}:</strong> {question.answer}{" "}
          <span className="text-ink-2">{formatInstant(question.answeredAt!)}</span>
        </p>
      )}
      {!question.answer && record.mayAnswer && (
        <AnswerQuestion employer={employer} questionId={question.id} action={answer} />
      )}
      {!question.answer && record.isMine && <p className="mt-1 text-ink-2">Not answered yet. You are mailed.</p>}
    </div>
  ));
}
