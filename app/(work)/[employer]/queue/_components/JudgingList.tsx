import { formatInstant } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { JudgingRow } from "@/lib/queries/listJudging";

/** Written hand-ins that an assessor judges; nothing where none waits. */
export function JudgingList({ employer, rows }: { employer: string; rows: readonly JudgingRow[] }) {
  if (rows.length === 0) return null;
  return (
    <section className="mt-8">
      <SectionHead title="To be judged" note="written accounts, by an assessor" />
      <Table reflow caption="Written accounts to be judged">
        <thead>
          <tr>
            <Th>Sitting</Th>
            <Th>Technician</Th>
            <Th>Check</Th>
            <Th>Handed in</Th>
            <Th />
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Tr key={row.caseId}>
              <RowHead>S-{row.sittingNumber}</RowHead>
              <Td label="Technician">{row.technician}</Td>
              <Td label="Check">
                {row.code} {row.checkTitle}
                {row.caseNumber > 1 && `, case ${row.caseNumber}`}
              </Td>
              <Td label="Handed in">{formatInstant(row.handedInAt)}</Td>
              <Td>
                <LinkKey href={`/${employer}/queue/judging/${row.caseId}`} size="small">
                  Read and judge
                </LinkKey>
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
