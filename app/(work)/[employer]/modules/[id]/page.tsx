import type { Metadata } from "next";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { can } from "@/lib/policies/can";
import { checkDraft } from "@/lib/queries/checkDraft";
import { getModule } from "@/lib/queries/getModule";
import { releaseModuleAction } from "../actions";
import { ModuleDesk } from "./_components/ModuleDesk";
import { ReleaseList } from "./_components/ReleaseList";

export const metadata: Metadata = { title: "Module" };

export default async function ModulePage({ params }: { params: Promise<{ employer: string; id: string }> }) {
  const { employer, id } = await params;
  const actor = await requireActor(employer);
  const draft = await orNotFound(getModule(actor, id));
  if (!can.writeModule(actor, actor)) return <ReleaseList employer={employer} draft={draft} />;
  return (
    <ModuleDesk
      employer={employer}
      draft={draft}
      reading={await checkDraft(actor, id, draft.source)}
      release={releaseModuleAction}
    />
  );
}
