import { Glyph } from "@/components/ui/Glyph";
import { formatInstant } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import type { CertificateReviewRow } from "@/lib/queries/listCertificateReviews";

/** Valid certificates whose sitting was marked again and no longer meets its requirement; nothing when there is none. */
export function CertificateReviews({ employer, rows }: { employer: string; rows: readonly CertificateReviewRow[] }) {
  if (rows.length === 0) return null;
  return (
    <section className="mt-8">
      <SectionHead
        title="Certificates to review"
        note="the requirement is no longer met since a case was marked again"
      />
      <Table reflow caption="Certificates to review">
        <thead>
          <tr>
            <Th>Certificate</Th>
            <Th>Holder</Th>
            <Th>Module</Th>
            <Th>Sitting</Th>
            <Th>Marked again</Th>
            <Th />
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Tr key={row.number}>
              <RowHead>
                <span className="flex items-center gap-2">
                  <Glyph name="awaiting" /> {row.number}
                </span>
              </RowHead>
              <Td label="Holder">{row.technician}</Td>
              <Td label="Module">
                {row.code} {row.title}
              </Td>
              <Td label="Sitting">S-{row.sittingNumber}</Td>
              <Td label="Marked again">{formatInstant(row.markedAt)}</Td>
              <Td>
                <LinkKey href={`/${employer}/register/${row.number}`} size="small">
                  Open the register entry
                </LinkKey>
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
