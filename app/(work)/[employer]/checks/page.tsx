import type { Metadata } from "next";
import { SittingTable } from "@/components/sittings/SittingTable";
import { Empty } from "@/components/ui/Empty";
import { LinkKey } from "@/components/ui/LinkKey";
import { requireActor } from "@/lib/auth/requireActor";
import { listOwnSittings } from "@/lib/queries/listSittings";

export const metadata: Metadata = { title: "Checks" };

export default async function ChecksPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const rows = await listOwnSittings(await requireActor(employer));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Your checks</h1>
      <div className="mt-6">
        {rows.length > 0 ? (
          <SittingTable employer={employer} rows={rows} />
        ) : (
          <Empty title="Nothing is assigned to you" action={<LinkKey href="/bench">Open the bench</LinkKey>}>
            Your training lead assigns a module; you are mailed when that happens. The bench is yours at any time.
          </Empty>
        )}
      </div>
    </div>
  );
}
