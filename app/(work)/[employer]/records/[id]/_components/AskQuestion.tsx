"use client";
import { useActionState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Notice } from "@/components/ui/Notice";
import { Select } from "@/components/ui/Select";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { TextArea } from "@/components/ui/TextArea";

type AskQuestionProps = {
  employer: string;
  recordId: string;
  quantities: readonly { of: string; label: string }[];
  action: FormAction;
};

export function AskQuestion({ employer, recordId, quantities, action }: AskQuestionProps) {
  const [result, send] = useActionState(action, null);
  return (
    <details className="mt-3">
      <summary className="key key-plain cursor-pointer">Question a quantity</summary>
      <form action={send} className="mt-4 grid gap-4">
        <input type="hidden" name="employer" value={employer} />
        <input type="hidden" name="record" value={recordId} />
        <Select
          label="Quantity"
          name="quantity"
          empty="Choose a quantity"
          choices={quantities.map(({ of, label }) => ({ value: of, label }))}
          error={fieldError(result, "quantity")}
          required
        />
        <TextArea
          label="Your question"
          name="words"
          rows={4}
          maxLength={2000}
          help="It is read before the decision and stays with the record."
          error={fieldError(result, "words")}
          required
        />
        {result?.ok && <Notice tone="plus" fact="Asked." live />}
        {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
        <SubmitKey variant="plain">Ask</SubmitKey>
      </form>
    </details>
  );
}
