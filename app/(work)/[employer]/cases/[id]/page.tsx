import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { CaseDesk } from "@/components/checks/CaseDesk";
import { CaseWaiting } from "@/components/checks/CaseWaiting";
import { ModuleTree } from "@/components/mdx/ModuleTree";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getCase } from "@/lib/queries/getCase";

export const metadata: Metadata = { title: "Case" };

export default async function CasePage({ params }: { params: Promise<{ employer: string; id: string }> }) {
  const { employer, id } = await params;
  const { brief, ...open } = await orNotFound(getCase(await requireActor(employer), id));
  if (open.state === "marked") redirect(`/${employer}/records/${id}`);
  if (open.state === "open" && open.view) {
    const text = brief && <ModuleTree tree={brief} />;
    return <CaseDesk employer={employer} open={{ ...open, view: open.view }} brief={text} />;
  }
  return <CaseWaiting employer={employer} open={open} />;
}
