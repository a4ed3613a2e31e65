"use client";
import { useActionState } from "react";
import { fieldError, messageOf, type FormAction } from "@/components/ui/actionResult";
import { Field } from "@/components/ui/Field";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

type SetPasswordFormProps = { email: string; asksPresent: boolean; isFirst: boolean; action: FormAction };

export function SetPasswordForm({ email, asksPresent, isFirst, action }: SetPasswordFormProps) {
  const [result, send] = useActionState(action, null);
  return (
    <form action={send} className="mt-4 grid gap-4">
      {/* Password keepers file a password under the address beside it. */}
      <input type="hidden" autoComplete="username" defaultValue={email} />
      {asksPresent && (
        <Field
          label="Present password"
          name="current"
          type="password"
          autoComplete="current-password"
          error={fieldError(result, "current")}
          required
        />
      )}
      <Field
        label="New password"
        name="password"
        type="password"
        autoComplete="new-password"
        minLength={12}
        help="12 characters or more. Several words are easy to type and hard to guess."
        error={fieldError(result, "password")}
        required
      />
      <Field
        label="New password, again"
        name="again"
        type="password"
        autoComplete="new-password"
        error={fieldError(result, "again")}
        required
      />
      <div>
        <SubmitKey variant="plain">{isFirst ? "Set the password" : "Change the password"}</SubmitKey>
      </div>
      {messageOf(result) && (
        <Notice tone="minus" fact={messageOf(result)!} live>
          {isFirst ? "No password is set." : "The present password still holds."}
        </Notice>
      )}
      {result?.ok && (
        <Notice tone="plus" fact="The password is stored." live>
          Your other sessions have ended.
        </Notice>
      )}
    </form>
  );
}
