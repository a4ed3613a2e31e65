import type { Metadata } from "next";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getReleaseCheck } from "@/lib/queries/getReleaseCheck";
import { askReleaseCheckAction, stopReleaseCheckAction } from "../../actions";
import { ReleaseCheckDesk } from "./_components/ReleaseCheckDesk";

export const metadata: Metadata = { title: "Release check" };

export default async function ReleaseCheckPage({ params }: { params: Promise<{ employer: string; id: string }> }) {
  const { employer, id } = await params;
  const view = await orNotFound(getReleaseCheck(await requireActor(employer), id));
  return (
    <ReleaseCheckDesk employer={employer} first={view} ask={askReleaseCheckAction} stop={stopReleaseCheckAction} />
  );
}
