"use client";
import { useActionState } from "react";
import { messageOf, type FormAction } from "@/components/ui/actionResult";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { SubmitKey } from "@/components/ui/SubmitKey";

type FollowLinkFormProps = { action: FormAction; email: string; token: string; back?: string };

export function FollowLinkForm({ action, email, token, back }: FollowLinkFormProps) {
  const [result, send] = useActionState(action, null);
  const message = messageOf(result);
  if (message) {
    return (
      <Notice
        className="mt-6 max-w-measure"
        tone="minus"
        fact={message}
        action={
          <LinkKey href="/sign-in" size="small">
            Have a new one mailed
          </LinkKey>
        }
        live
      >
        Nobody is signed in.
      </Notice>
    );
  }
  return (
    <form action={send} className="mt-6">
      <input type="hidden" name="email" value={email} />
      <input type="hidden" name="token" value={token} />
      {back && <input type="hidden" name="back" value={back} />}
      <SubmitKey size="large">Sign in</SubmitKey>
    </form>
  );
}
