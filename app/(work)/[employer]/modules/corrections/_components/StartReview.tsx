"use client";
import { useActionState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

type StartReviewProps = { employer: string; marking: string; older: number; action: FormAction };

/** Have the worker hold the corrected marking against the firm's records; nothing changes by it. */
export function StartReview({ employer, marking, older, action }: StartReviewProps) {
  const [result, send] = useActionState(action, null);
  return (
    <form action={send} className="mt-4 grid gap-4">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="marking" value={marking} />
      <p className="text-dense">
        {older === 1 ? "One case" : `${older} cases`} of your firm {older === 1 ? "has" : "have"} a record of an older
        marking. To hold the new one against them changes nothing.
      </p>
      <div>
        <SubmitKey>Compare the records</SubmitKey>
      </div>
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
    </form>
  );
}
