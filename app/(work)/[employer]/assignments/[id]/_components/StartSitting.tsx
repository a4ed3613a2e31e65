"use client";
import Link from "next/link";
import { useActionState, useState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { CheckBox } from "@/components/ui/CheckBox";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

type StartSittingProps = { employer: string; assignmentId: string; action: FormAction };

/** The conditions, accepted before the first case is drawn; the sitting keeps which version was accepted. */
export function StartSitting({ employer, assignmentId, action }: StartSittingProps) {
  const [result, send] = useActionState(action, null);
  const [accepted, setAccepted] = useState(false);
  return (
    <form action={send} className="mt-6 grid gap-4">
      <input type="hidden" name="employer" value={employer} />
      <input type="hidden" name="assignment" value={assignmentId} />
      <ul className="grid list-disc gap-2 pl-5 text-dense">
        <li>Each check gives you a case of your own, with its own clock. Open one when you have the time for it.</li>
        <li>You work alone, with the listed aids only, and you pass nothing on: no case, no numbers.</li>
        <li>A case handed in is final. Then you see the whole marking record.</li>
        <li>
          Your answers, the marking and the decision are kept as evidence of the certificate; what is kept how long
          stands under{" "}
          <Link className="link" href="/privacy">
            privacy
          </Link>
          .
        </li>
        <li>
          A person decides, not the marking. You may{" "}
          <Link className="link" href="/impartiality">
            appeal
          </Link>
          .
        </li>
      </ul>
      <CheckBox
        label="I accept these conditions"
        checked={accepted}
        onChange={(event) => setAccepted(event.target.checked)}
      />
      {messageOf(result) && <Notice tone="minus" fact={messageOf(result)!} live />}
      <SubmitKey wide reason={accepted ? null : "Accept the conditions first."}>
        Start the sitting
      </SubmitKey>
    </form>
  );
}
