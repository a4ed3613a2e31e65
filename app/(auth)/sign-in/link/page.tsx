import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { followLinkInput } from "@/lib/schemas/people";
import { FollowLinkForm } from "../_components/FollowLinkForm";
import { followLinkAction } from "../actions";

export const metadata: Metadata = { title: "Sign in", robots: { index: false }, referrer: "no-referrer" };

/** Where a mailed link leads. Opening the page uses nothing up; pressing the key does. */
export default async function LinkPage({ searchParams }: { searchParams: Promise<Record<string, unknown>> }) {
  const { data } = followLinkInput.safeParse(await searchParams);
  if (!data) notFound();
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Sign in</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        As <strong className="font-semibold text-ink">{data.email}</strong>, on this device, for twelve hours.
      </p>
      <FollowLinkForm action={followLinkAction} {...data} />
    </div>
  );
}
