import { formatInstant } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { WorkBar } from "@/components/ui/WorkBar";
import type { ModuleView } from "@/lib/queries/getModule";

/** For those who may read a module and not write it: its releases. */
export function ReleaseList({ employer, draft }: { employer: string; draft: ModuleView }) {
  return (
    <>
      <WorkBar eyebrow="Module" title={`${draft.code} ${draft.title}`} />
      <div className="page py-8">
        <Table reflow caption="Releases, newest first">
          <thead>
            <tr>
              <Th>Release</Th>
              <Th>Kind</Th>
              <Th>Released</Th>
              <Th>By</Th>
              <Th>Reason</Th>
              <Th />
            </tr>
          </thead>
          <tbody>
            {draft.releases.map((release) => (
              <Tr key={release.id}>
                <RowHead>{release.number}</RowHead>
                <Td label="Kind">{release.kind}</Td>
                <Td label="Released">{formatInstant(release.releasedAt)}</Td>
                <Td label="By">{release.releasedBy}</Td>
                <Td label="Reason">{release.reason}</Td>
                <Td>
                  <LinkKey href={`/${employer}/modules/${draft.id}/releases/${release.number}`} size="small">
                    Open
                  </LinkKey>
                </Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      </div>
    </>
  );
}
