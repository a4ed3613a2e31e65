import type { Metadata } from "next";
import { LinkKey } from "@/components/ui/LinkKey";

export const metadata: Metadata = { title: "Look in your mail" };

export default function SentPage() {
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Look in your mail</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        If the address has an account, a link is on its way to it. It works once, within 30 minutes.
      </p>
      <p className="mt-4 max-w-measure">
        Nothing came after a few minutes? Look where unwanted mail is kept, check the address, and ask your
        employer&rsquo;s administrator whether you were added.
      </p>
      <div className="mt-6">
        <LinkKey href="/sign-in">Back to sign in</LinkKey>
      </div>
    </div>
  );
}
