import type { Metadata } from "next";
import { ReleasedOutsideList } from "@/components/checks/ReleasedOutsideList";
import { ModuleTree } from "@/components/mdx/ModuleTree";
import { SittingStateWord } from "@/components/sittings/SittingStateWord";
import { ChipStrip } from "@/components/ui/ChipStrip";
import { formatDay, formatInstant } from "@/components/ui/formatDay";
import { Ledger } from "@/components/ui/Ledger";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { WorkBar } from "@/components/ui/WorkBar";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { can } from "@/lib/policies/can";
import { getRelease, type ReleaseView } from "@/lib/queries/getRelease";
import { getReleaseStatistics } from "@/lib/queries/getReleaseStatistics";
import { AssignRelease } from "./_components/AssignRelease";
import { CheckFigures } from "./_components/CheckFigures";
import { assignReleaseAction } from "./actions";

export const metadata: Metadata = { title: "Release" };

type Props = { params: Promise<{ employer: string; id: string; number: string }> };

export default async function ReleasePage({ params }: Props) {
  const { employer, id, number } = await params;
  const actor = await requireActor(employer);
  const release = await orNotFound(getRelease(actor, id, number));
  const figures = can.readStatistics(actor, actor) ? await getReleaseStatistics(actor, release.id) : null;
  return (
    <>
      <WorkBar
        eyebrow={`Release ${release.number}, ${release.kind}`}
        title={`${release.code} ${release.title}`}
        keys={<LinkKey href={`/${employer}/modules/${id}`}>Open the module</LinkKey>}
      />
      <div className="page grid gap-x-14 gap-y-10 py-8 desk:grid-cols-[2fr_1fr]">
        <div className="grid min-w-0 content-start gap-10">
          {can.assignRelease(actor, actor) && (
            <AssignRelease
              employer={employer}
              releaseId={release.id}
              technicians={release.technicians}
              action={assignReleaseAction}
            />
          )}
          <Assigned employer={employer} release={release} />
          {figures && <CheckFigures figures={figures} />}
          {release.outside.length > 0 && (
            <section aria-labelledby="outside">
              <SectionHead title="Released outside a bound" id="outside" note="of the release check" />
              <div className="mt-3">
                <ReleasedOutsideList outside={release.outside} />
              </div>
            </section>
          )}
          <details className="border-t-hair border-rule-strong pt-4" open={release.assigned.length === 0}>
            <summary className="plate cursor-pointer py-1 text-h3 pointer-coarse:py-2.5">The released text</summary>
            <article className="mt-4 bg-sheet px-6 py-6 tablet:px-10">
              <ModuleTree tree={release.tree} checkCards={release.checkCards} />
            </article>
          </details>
        </div>
        <aside className="grid content-start gap-7">
          <section>
            <SectionHead title="Fingerprint" note="of the canonical record" />
            <div className="mt-3 border-hair border-rule bg-sheet p-4">
              <ChipStrip fingerprint={release.fingerprint} width={330} />
              <p className="mt-3 break-all font-code text-[0.8125rem] text-ink-2">{release.fingerprint}</p>
            </div>
            <p className="mt-2 text-label font-normal text-ink-2">The strip helps the eye; it is no proof.</p>
          </section>
          <Ledger
            narrow
            rows={[
              { label: "Released", value: formatInstant(release.releasedAt) },
              { label: "By", value: release.releasedBy },
              { label: "Why", value: release.reason },
              { label: "Valid", value: `${release.frontMatter.valid.months} months` },
              { label: "Days", value: String(release.frontMatter.sitting.days) },
            ]}
          />
        </aside>
      </div>
    </>
  );
}

function Assigned({ employer, release }: { employer: string; release: ReleaseView }) {
  if (release.assigned.length === 0) return null;
  return (
    <section aria-labelledby="assigned">
      <SectionHead title="Assigned" id="assigned" />
      <Table reflow caption="Assignments of this release">
        <thead>
          <tr>
            <Th>Technician</Th>
            <Th>Due</Th>
            <Th>State</Th>
            <Th />
          </tr>
        </thead>
        <tbody>
          {release.assigned.map((line) => (
            <Tr key={line.id}>
              <RowHead>{line.technician}</RowHead>
              <Td label="Due">{formatDay(line.dueOn)}</Td>
              <Td label="State">
                <SittingStateWord state={line.state} />
              </Td>
              <Td>
                <LinkKey
                  size="small"
                  href={
                    line.sittingId ? `/${employer}/sittings/${line.sittingId}` : `/${employer}/assignments/${line.id}`
                  }
                >
                  Open
                </LinkKey>
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
