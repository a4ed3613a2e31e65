import { formatInstant } from "@/components/ui/formatDay";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { DecisionDeskView } from "@/lib/queries/getDecisionDesk";

type Props = { records: DecisionDeskView["records"]; checks: DecisionDeskView["sitting"]["checks"] };

/** When each case was open and how it came in; server time throughout. */
export function SittingLog({ records, checks }: Props) {
  if (records.length === 0) return <p className="text-dense text-ink-2">No case was opened.</p>;
  return (
    <Table reflow caption="Cases of this sitting">
      <thead>
        <tr>
          <Th>Case</Th>
          <Th>Opened</Th>
          <Th>Handed in</Th>
          <Th figure>Time used</Th>
          <Th>How</Th>
        </tr>
      </thead>
      <tbody>
        {records.map((record) => (
          <Tr key={record.caseId}>
            <RowHead>
              {checks.find((check) => check.plan.id === record.checkId)!.plan.title}, case {record.caseNumber}
            </RowHead>
            <Td label="Opened">{formatInstant(record.openedAt)}</Td>
            <Td label="Handed in">{formatInstant(record.handedInAt)}</Td>
            <Td label="Time used" figure>
              {minutes(record.openedAt, record.handedInAt)} of {minutes(record.openedAt, record.endsAt)} min
            </Td>
            <Td label="How">{record.byClock ? "by the clock" : "by the technician"}</Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}

const minutes = (from: string, to: string) => Math.round((Date.parse(to) - Date.parse(from)) / 60_000);
