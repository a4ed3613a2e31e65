"use client";
import { useActionState, useState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

/** Put one stopped job back, or leave it and say why. */
export function ActOnJob({ jobId, action }: { jobId: string; action: FormAction }) {
  const [result, send] = useActionState(action, null);
  const [reason, setReason] = useState("");
  return (
    <form action={send} className="grid gap-2">
      <input type="hidden" name="job" value={jobId} />
      {/* First in the form: it is what Enter in the field presses. */}
      <div className="flex flex-wrap gap-2">
        <SubmitKey name="act" value="leave" variant="plain" size="small">
          Leave
        </SubmitKey>
        <SubmitKey name="act" value="try again" size="small">
          Try again
        </SubmitKey>
      </div>
      <Field
        label="Reason"
        name="reason"
        note="needed where it is left"
        maxLength={1000}
        value={reason}
        onChange={(event) => setReason(event.target.value)}
        error={fieldError(result, "reason")}
      />
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
    </form>
  );
}
