"use client";
import { useActionState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { TextArea } from "@/components/ui/TextArea";

type AnswerQuestionProps = { employer: string; questionId: string; action: FormAction };

export function AnswerQuestion({ employer, questionId, action }: AnswerQuestionProps) {
  const [result, send] = useActionState(action, null);
  return (
    <form action={send} className="mt-3 grid gap-3">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="question" value={questionId} />
      <TextArea
        label="Your answer"
        name="words"
        rows={4}
        maxLength={2000}
        help="It goes to the technician and stays with the record."
        error={fieldError(result, "words")}
        required
      />
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
      <SubmitKey variant="plain">Answer</SubmitKey>
    </form>
  );
}
