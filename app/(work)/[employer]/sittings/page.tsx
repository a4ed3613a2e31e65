import type { Metadata } from "next";
import { SittingTable } from "@/components/sittings/SittingTable";
import { Empty } from "@/components/ui/Empty";
import { LinkKey } from "@/components/ui/LinkKey";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { listSittings } from "@/lib/queries/listSittings";

export const metadata: Metadata = { title: "Sittings" };

export default async function SittingsPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const rows = await orNotFound(listSittings(await requireActor(employer)));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Sittings</h1>
      <div className="mt-6">
        {rows.length > 0 ? (
          <SittingTable employer={employer} rows={rows} showTechnician />
        ) : (
          <Empty title="No sitting yet" action={<LinkKey href={`/${employer}/modules`}>Open the modules</LinkKey>}>
            Release a module and assign it to a technician.
          </Empty>
        )}
      </div>
    </div>
  );
}
