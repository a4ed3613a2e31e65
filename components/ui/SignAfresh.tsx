"use client";
import type { ReactNode } from "react";
import { useState, useTransition } from "react";
import { messageOf, type ActionResult, type FormAction } from "./actionResult";
import { Dialog } from "./Dialog";
import { Field } from "./Field";
import { Key } from "./Key";
import { Notice } from "./Notice";

type SignAfreshProps = {
  open: boolean;
  onClose: () => void;
  title: string;
  employer: string;
  /** Gives the password; must succeed before `sign` is tried. */
  confirmPassword: FormAction;
  /** The act itself. */
  sign: () => Promise<ActionResult | null | void>;
  keyLabel: string;
  cut?: boolean;
  children: ReactNode;
};

/** Signing: the consequence, the password again, the key that names the outcome. */
export function SignAfresh({
  open,
  onClose,
  title,
  employer,
  confirmPassword,
  sign,
  keyLabel,
  cut,
  children,
}: SignAfreshProps) {
  const [password, setPassword] = useState("");
  const [message, setMessage] = useState<string | null>(null);
  const [pending, start] = useTransition();

  const submit = () =>
    start(async () => {
      const form = new FormData();
      form.set("employer", employer);
      form.set("password", password);
      const confirmed = await confirmPassword(null, form);
      if (!confirmed.ok)
        return setMessage(messageOf(confirmed) ?? confirmed.fields?.password?.[0] ?? "The password is not right.");
      setPassword("");
      const signed = await sign();
      setMessage(signed ? (messageOf(signed) ?? (signed.ok ? null : "Look at the marked fields.")) : null);
    });

  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={title}
      safe={<Key onClick={onClose}>Not now</Key>}
      act={
        <Key
          variant={cut ? "cut" : "filled"}
          busy={pending}
          reason={password ? null : "Enter your password."}
          onClick={submit}
        >
          {keyLabel}
        </Key>
      }
    >
      {children}
      <form
        onSubmit={(event) => {
          event.preventDefault();
          if (password && !pending) submit();
        }}
      >
        <Field
          label="Your password, again"
          type="password"
          autoComplete="current-password"
          value={password}
          onChange={(event) => setPassword(event.target.value)}
          help="Signing in afresh counts for five minutes."
        />
      </form>
      {message && (
        <Notice tone="minus" fact={message} live>
          Nothing was signed.
        </Notice>
      )}
    </Dialog>
  );
}
