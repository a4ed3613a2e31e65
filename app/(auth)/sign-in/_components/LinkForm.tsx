"use client";
import { useActionState } from "react";
import { fieldError, messageOf, type ActionResult } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

type Result = ActionResult & { email?: string };
type LinkFormProps = { action: (previous: Result | null, form: FormData) => Promise<Result>; back: string | null };

export function LinkForm({ action, back }: LinkFormProps) {
  const [result, send] = useActionState(action, null);
  const message = messageOf(result);
  return (
    <form action={send} className="mt-5 grid gap-5">
      {back && <input type="hidden" name="back" value={back} />}
      {message && (
        <Notice tone="minus" fact={message} live>
          No link was mailed.
        </Notice>
      )}
      <Field
        label="E-mail address"
        name="email"
        type="email"
        autoComplete="email"
        help="The link works once, within 30 minutes."
        defaultValue={result?.email}
        error={fieldError(result, "email")}
        required
      />
      <div>
        <SubmitKey variant="plain">Mail me a sign-in link</SubmitKey>
      </div>
    </form>
  );
}
