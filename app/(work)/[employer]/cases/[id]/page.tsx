import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { CaseDesk } from "@/components/checks/CaseDesk";
import { CaseWaiting } from "@/components/checks/CaseWaiting";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getCase } from "@/lib/queries/getCase";

export const metadata: Metadata = { title: "Case" };

export default async function CasePage({ params }: { params: Promise<{ employer: string; id: string }> }) {
  const { employer, id } = await params;
  const open = await orNotFound(getCase(await requireActor(employer), id));
  if (open.state === "marked") redirect(`/${employer}/records/${id}`);
  if (open.state === "open" && open.view) return <CaseDesk employer={employer} open={{ ...open, view: open.view }} />;
  return <CaseWaiting employer={employer} open={open} />;
}
