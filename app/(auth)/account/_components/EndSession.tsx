"use client";
import { useActionState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { SubmitKey } from "@/components/ui/SubmitKey";

export function EndSession({ sessionId, action }: { sessionId: string; action: FormAction }) {
  const [result, send] = useActionState(action, null);
  return (
    <form action={send} className="flex flex-wrap items-center justify-end gap-3">
      <input type="hidden" name="sessionId" value={sessionId} />
      {messageOf(result) && <span role="alert">{messageOf(result)}</span>}
      <SubmitKey variant="plain" size="small">
        End
      </SubmitKey>
    </form>
  );
}
