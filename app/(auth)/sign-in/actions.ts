"use server";
import "server-only";
import { redirect } from "next/navigation";
import { parsed } from "@/lib/auth/action";
import { toResult, type ActionResult } from "@/lib/auth/actionResult";
import { formValues } from "@/lib/auth/formValues";
import { homeAddress } from "@/lib/auth/homeAddress";
import { safeBack } from "@/lib/auth/safeBack";
import { askForLink, signInByLink, signInByPassword } from "@/lib/auth/sign-in";
import { InvalidError } from "@/lib/errors";
import { followLinkInput, mailLinkInput, signInInput } from "@/lib/schemas/people";

/** With the address as it was typed, so that it need not be typed again. */
export type SignInResult = ActionResult & { email?: string };

export async function signInAction(_previous: unknown, form: FormData): Promise<SignInResult> {
  const result = await toResult(async () => {
    const { email, password, back } = parsed(signInInput, formValues(form));
    if (!(await signInByPassword(email, password))) {
      throw new InvalidError("Address and password do not belong together. Check both, or have a link mailed to you.");
    }
    redirect(safeBack(back) ?? (await homeAddress()) ?? "/sign-in");
  });
  return { ...result, email: typed(form) };
}

export async function mailLinkAction(_previous: unknown, form: FormData): Promise<SignInResult> {
  const result = await toResult(async () => {
    const { email, back } = parsed(mailLinkInput, formValues(form));
    await askForLink(email, safeBack(back));
    redirect("/sign-in/sent");
  });
  return { ...result, email: typed(form) };
}

export async function followLinkAction(_previous: unknown, form: FormData): Promise<ActionResult> {
  return toResult(async () => {
    const { email, token, back } = parsed(followLinkInput, formValues(form));
    if (!(await signInByLink(email, token))) {
      throw new InvalidError("This link was used already, or its time is over.");
    }
    redirect(safeBack(back) ?? (await homeAddress()) ?? "/sign-in");
  });
}

const typed = (form: FormData) => String(form.get("email") ?? "").slice(0, 254);
