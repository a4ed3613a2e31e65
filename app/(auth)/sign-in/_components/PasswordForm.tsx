"use client";
import { useActionState } from "react";
import { fieldError, messageOf, type ActionResult } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

type Result = ActionResult & { email?: string };
type PasswordFormProps = {
  action: (previous: Result | null, form: FormData) => Promise<Result>;
  back: string | null;
};

export function PasswordForm({ action, back }: PasswordFormProps) {
  const [result, send] = useActionState(action, null);
  const message = messageOf(result);
  return (
    <form action={send} className="mt-5 grid gap-5">
      {back && <input type="hidden" name="back" value={back} />}
      {message && (
        <Notice tone="minus" fact={message} live>
          Nobody is signed in.
        </Notice>
      )}
      <Field
        label="E-mail address"
        name="email"
        type="email"
        autoComplete="username"
        defaultValue={result?.email}
        error={fieldError(result, "email")}
        required
      />
      <Field
        label="Password"
        name="password"
        type="password"
        autoComplete="current-password"
        error={fieldError(result, "password")}
        required
      />
      <div>
        <SubmitKey>Sign in</SubmitKey>
      </div>
    </form>
  );
}
