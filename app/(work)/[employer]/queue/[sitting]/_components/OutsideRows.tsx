import { Gauge } from "@/components/ui/Gauge";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { DecisionDeskView } from "@/lib/queries/getDecisionDesk";

type Props = { records: DecisionDeskView["records"]; checks: DecisionDeskView["sitting"]["checks"] };

/** Every line outside its tolerance, with what was computed and why it differs. */
export function OutsideRows({ records, checks }: Props) {
  const lines = records.flatMap((record) =>
    record.rows.filter((row) => !row.within).map((row) => ({ ...row, record })),
  );
  if (lines.length === 0) return <p className="text-dense text-ink-2">Every line is within its tolerance.</p>;
  const title = (id: string) => checks.find((check) => check.plan.id === id)!.plan.title;
  return (
    <Table reflow caption="Lines outside tolerance">
      <thead>
        <tr>
          <Th>Line</Th>
          <Th figure>Handed in</Th>
          <Th figure>Computed</Th>
          <Th figure>Tolerance</Th>
          <Th>Against tolerance</Th>
        </tr>
      </thead>
      <tbody>
        {lines.map((line, index) => (
          <Tr key={index}>
            <RowHead>
              {line.subject ? `${line.subject}, ${line.label}` : line.label}
              {line.critical && <span className="font-normal text-minus-deep"> critical</span>}
              <span className="block text-label font-normal text-ink-2">
                {title(line.record.checkId)}
                {line.record.caseNumber > 1 && `, case ${line.record.caseNumber}`}
              </span>
              {line.reason && <span className="block max-w-measure text-dense font-normal">{line.reason}</span>}
            </RowHead>
            <Td label="Handed in" figure>
              {line.understood ?? (line.handedIn || "–")}
            </Td>
            <Td label="Computed" figure>
              {line.computed}
            </Td>
            <Td label="Tolerance" figure>
              {line.tolerance}
            </Td>
            <Td label="Against tolerance">
              {line.offByTolerances !== null && <Gauge offByTolerances={line.offByTolerances} within={false} />}
            </Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}
