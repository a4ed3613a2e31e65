import { formatDay } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { SittingRow } from "@/lib/queries/listSittings";
import { SittingStateWord } from "./SittingStateWord";

/** Assignments and sittings; `showTechnician` in lists of the firm. */
export function SittingTable({
  employer,
  rows,
  showTechnician,
}: {
  employer: string;
  rows: readonly SittingRow[];
  showTechnician?: boolean;
}) {
  return (
    <Table reflow caption="Sittings">
      <thead>
        <tr>
          <Th>{showTechnician ? "Technician" : "Module"}</Th>
          {showTechnician && <Th>Module</Th>}
          <Th>Sitting</Th>
          <Th>State</Th>
          <Th figure>Checks met</Th>
          <Th>Day</Th>
          <Th />
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Tr key={row.assignmentId}>
            <RowHead>{showTechnician ? row.technician : `${row.code} ${row.title}`}</RowHead>
            {showTechnician && (
              <Td label="Module">
                {row.code} {row.title}, release {row.release}
              </Td>
            )}
            <Td label="Sitting">{row.number ? `S-${row.number}` : "–"}</Td>
            <Td label="State">
              <SittingStateWord state={row.state} />
            </Td>
            <Td label="Checks met" figure>
              {row.met} of {row.checks}
            </Td>
            <Td label="Day" className="whitespace-nowrap">
              {row.lastDay ? `Last day ${formatDay(row.lastDay)}` : `Due ${formatDay(row.dueOn)}`}
            </Td>
            <Td>
              <LinkKey href={sittingAddress(employer, row)} size="small">
                Open
              </LinkKey>
            </Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}

export const sittingAddress = (employer: string, row: Pick<SittingRow, "sittingId" | "assignmentId">): string =>
  row.sittingId ? `/${employer}/sittings/${row.sittingId}` : `/${employer}/assignments/${row.assignmentId}`;
