import { formatInstant } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { QuestionRow } from "@/lib/queries/listQuestions";

/** Questioned quantities without an answer; nothing where none waits. */
export function QuestionList({ employer, rows }: { employer: string; rows: readonly QuestionRow[] }) {
  if (rows.length === 0) return null;
  return (
    <section className="mt-8">
      <SectionHead title="Questions" note="answered by an assessor in the record" />
      <Table reflow caption="Questioned quantities">
        <thead>
          <tr>
            <Th>Sitting</Th>
            <Th>Technician</Th>
            <Th>Quantity</Th>
            <Th>Question</Th>
            <Th>Asked</Th>
            <Th />
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Tr key={row.id}>
              <RowHead>S-{row.sittingNumber}</RowHead>
              <Td label="Technician">{row.technician}</Td>
              <Td label="Quantity">
                {row.quantity}
                <span className="block text-label font-normal text-ink-2">
                  {row.code} {row.checkTitle}
                </span>
              </Td>
              <Td label="Question">{row.words.length > 160 ? `${row.words.slice(0, 160)}…` : row.words}</Td>
              <Td label="Asked">{formatInstant(row.askedAt)}</Td>
              <Td>
                <LinkKey href={`/${employer}/records/${row.caseId}`} size="small">
                  Open the record
                </LinkKey>
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
