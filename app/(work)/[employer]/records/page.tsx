import type { Metadata } from "next";
import { Empty } from "@/components/ui/Empty";
import { formatInstant } from "@/components/ui/formatDay";
import { Glyph } from "@/components/ui/Glyph";
import { LinkKey } from "@/components/ui/LinkKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { listRecords } from "@/lib/queries/listRecords";

export const metadata: Metadata = { title: "Records" };

export default async function RecordsPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const rows = await orNotFound(listRecords(await requireActor(employer)));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Marking records</h1>
      <div className="mt-6">
        {rows.length === 0 ? (
          <Empty title="No record yet">A marking record is made when a technician hands a case in.</Empty>
        ) : (
          <Table reflow caption="Marking records, newest first">
            <thead>
              <tr>
                <Th>Technician</Th>
                <Th>Sitting</Th>
                <Th>Check</Th>
                <Th>Marked</Th>
                <Th figure>Within</Th>
                <Th>Result</Th>
                <Th />
              </tr>
            </thead>
            <tbody>
              {rows.map((row) => (
                <Tr key={row.caseId}>
                  <RowHead>{row.technician}</RowHead>
                  <Td label="Sitting">S-{row.sittingNumber}</Td>
                  <Td label="Check">
                    {row.code}, {row.checkTitle}
                    {row.caseNumber > 1 && `, case ${row.caseNumber}`}
                  </Td>
                  <Td label="Marked">{formatInstant(row.markedAt)}</Td>
                  <Td label="Within" figure>
                    {row.withinCount} of {row.quantityCount}
                  </Td>
                  <Td label="Result">
                    <span className="flex items-center gap-2">
                      <Glyph name={row.met ? "within" : "outside"} />
                      {row.met ? "Met" : "Not met"}
                      {row.questions > 0 && (row.questions === 1 ? ", 1 question" : `, ${row.questions} questions`)}
                    </span>
                  </Td>
                  <Td>
                    <LinkKey href={`/${employer}/records/${row.caseId}`} size="small">
                      Open
                    </LinkKey>
                  </Td>
                </Tr>
              ))}
            </tbody>
          </Table>
        )}
      </div>
    </div>
  );
}
