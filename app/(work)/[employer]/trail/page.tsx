import type { Metadata } from "next";
import { Empty } from "@/components/ui/Empty";
import { formatInstant } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { listTrail } from "@/lib/queries/listTrail";

export const metadata: Metadata = { title: "Trail" };

const PAGE = 100;

type Props = { params: Promise<{ employer: string }>; searchParams: Promise<{ before?: string }> };

export default async function TrailPage({ params, searchParams }: Props) {
  const { employer } = await params;
  const { before } = await searchParams;
  const rows = await orNotFound(listTrail(await requireActor(employer), before ?? null));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Trail</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        Every act of the chain, in order. Entries are linked by hashes within seconds and the head is signed, so that a
        row changed behind the product&rsquo;s back is found.
      </p>
      {rows.length === 0 ? (
        <div className="mt-8">
          <Empty title="Nothing here">No act of this firm is older than what you have seen.</Empty>
        </div>
      ) : (
        <div className="mt-6">
          <Table reflow caption="Trail entries, newest first">
            <thead>
              <tr>
                <Th figure>Link</Th>
                <Th>At</Th>
                <Th>Act</Th>
                <Th>By</Th>
                <Th>Row</Th>
                <Th>SHA-256 of the row</Th>
              </tr>
            </thead>
            <tbody>
              {rows.map((row) => (
                <Tr key={row.id}>
                  <Td label="Link" figure>
                    {row.sequence ?? "–"}
                  </Td>
                  <RowHead className="whitespace-nowrap">{formatInstant(row.at, { seconds: true })}</RowHead>
                  <Td label="Act">{row.act.replaceAll("_", " ")}</Td>
                  <Td label="By">{row.actor ?? "the server"}</Td>
                  <Td label="Row">
                    <code className="font-code text-[0.8125rem]">{row.subjectKey.slice(0, 8)}</code>
                  </Td>
                  <Td label="SHA-256 of the row">
                    <code className="font-code text-[0.8125rem]">{row.rowSha256.slice(0, 16)}</code>
                  </Td>
                </Tr>
              ))}
            </tbody>
          </Table>
          {rows.length === PAGE && (
            <div className="mt-6">
              <LinkKey href={`/${employer}/trail?before=${rows.at(-1)!.id}`}>Older entries</LinkKey>
            </div>
          )}
        </div>
      )}
    </div>
  );
}
