import Link from "next/link";
import type { Metadata } from "next";
import { Empty } from "@/components/ui/Empty";
import { formatDay } from "@/components/ui/formatDay";
import { Glyph } from "@/components/ui/Glyph";
import { LinkKey } from "@/components/ui/LinkKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { can } from "@/lib/policies/can";
import { listModules } from "@/lib/queries/listModules";
import { NewModule } from "./_components/NewModule";
import { createModuleAction } from "./actions";

export const metadata: Metadata = { title: "Modules" };

export default async function ModulesPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const actor = await requireActor(employer);
  const rows = await orNotFound(listModules(actor));
  return (
    <div className="page py-8 desk:py-10">
      <div className="flex flex-wrap items-center justify-between gap-4">
        <h1 className="text-h1">Modules</h1>
        {can.reviewMarkings(actor, actor) && (
          <LinkKey href={`/${employer}/modules/corrections`} size="small">
            Corrected markings
          </LinkKey>
        )}
      </div>
      <div className="mt-6 grid gap-x-14 gap-y-10 desk:grid-cols-[2fr_1fr]">
        <div className="min-w-0">
          {rows.length === 0 ? (
            <Empty title="No module yet">
              Write the first one: what your technicians do, with practical checks attached.
            </Empty>
          ) : (
            <Table reflow caption="Modules">
              <thead>
                <tr>
                  <Th>Code</Th>
                  <Th>Title</Th>
                  <Th>Last release</Th>
                  <Th>Draft</Th>
                  <Th figure>Open sittings</Th>
                  <Th />
                </tr>
              </thead>
              <tbody>
                {rows.map((row) => (
                  <Tr key={row.id}>
                    <RowHead className="whitespace-nowrap">{row.code}</RowHead>
                    <Td label="Title">{row.title}</Td>
                    <Td label="Last release">
                      {row.number ? (
                        <Link className="link" href={`/${employer}/modules/${row.id}/releases/${row.number}`}>
                          {row.number}, {formatDay(row.releasedAt!)}
                        </Link>
                      ) : (
                        "none yet"
                      )}
                    </Td>
                    <Td label="Draft">
                      <span className="flex items-center gap-2 whitespace-nowrap">
                        <Glyph name={row.changed ? "awaiting" : "done"} />
                        {row.changed ? "changed" : "as released"}
                      </span>
                    </Td>
                    <Td label="Open sittings" figure>
                      {row.openSittings}
                    </Td>
                    <Td>
                      <LinkKey href={`/${employer}/modules/${row.id}`} size="small">
                        Open
                      </LinkKey>
                    </Td>
                  </Tr>
                ))}
              </tbody>
            </Table>
          )}
        </div>
        {can.writeModule(actor, actor) && <NewModule employer={employer} action={createModuleAction} />}
      </div>
    </div>
  );
}
