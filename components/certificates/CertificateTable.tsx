import { formatDay } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { CertificateRow } from "@/lib/queries/listCertificates";
import { StandingGlyph } from "./StandingGlyph";

type CertificateTableProps = {
  rows: readonly CertificateRow[];
  /** Address of one certificate is this and its number. */
  base: string;
  /** Where the signed file of each is, if it can be had from here. */
  fileOf?: (number: string) => string;
  /** Left out of a person's own list, where it would be the same in every row. */
  showHolder?: boolean;
};

export function CertificateTable({ rows, base, fileOf, showHolder }: CertificateTableProps) {
  return (
    <Table reflow caption="Certificates, newest first">
      <thead>
        <tr>
          <Th>Number</Th>
          {showHolder && <Th>Holder</Th>}
          <Th>Competence</Th>
          <Th>Issuer</Th>
          <Th>Last day</Th>
          <Th>Standing</Th>
          <Th />
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Tr key={row.number}>
            <RowHead className="whitespace-nowrap font-code">{row.number}</RowHead>
            {showHolder && <Td label="Holder">{row.holder}</Td>}
            <Td label="Competence">
              {row.code} {row.title}, release {row.release}
            </Td>
            <Td label="Issuer">{row.issuer}</Td>
            <Td label="Last day" className="whitespace-nowrap">
              {formatDay(row.lastDay)}
            </Td>
            <Td label="Standing">
              <StandingGlyph standing={row.standing} daysLeft={row.daysLeft} />
            </Td>
            <Td>
              <span className="flex flex-wrap gap-2">
                <LinkKey href={`${base}/${row.number}`} size="small">
                  Open
                </LinkKey>
                {fileOf && (
                  <LinkKey href={fileOf(row.number)} size="small" aria-label={`Download ${row.number} as PDF`}>
                    PDF
                  </LinkKey>
                )}
              </span>
            </Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}
