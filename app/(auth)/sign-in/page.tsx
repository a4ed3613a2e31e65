import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SectionHead } from "@/components/ui/SectionHead";
import { homeAddress } from "@/lib/auth/homeAddress";
import { safeBack } from "@/lib/auth/safeBack";
import { LinkForm } from "./_components/LinkForm";
import { PasswordForm } from "./_components/PasswordForm";
import { mailLinkAction, signInAction } from "./actions";

export const metadata: Metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: { searchParams: Promise<{ back?: string | string[] }> }) {
  const back = safeBack((await searchParams).back);
  const home = await homeAddress();
  if (home) redirect(back ?? home);
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Sign in</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        Your employer&rsquo;s administrator adds you. To verify a certificate you need no account.
      </p>
      <div className="mt-8 grid gap-x-(--gutter) gap-y-10 desk:grid-cols-[5fr_5fr_2fr]">
        <section aria-labelledby="with-password">
          <SectionHead title="With your password" id="with-password" note="needed to sign decisions" />
          <PasswordForm action={signInAction} back={back} />
        </section>
        <section aria-labelledby="with-link">
          <SectionHead title="With a mailed link" id="with-link" note="when there is no password, or it is lost" />
          <LinkForm action={mailLinkAction} back={back} />
        </section>
      </div>
    </div>
  );
}
