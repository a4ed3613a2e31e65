import type { Metadata } from "next";
import { Empty } from "@/components/ui/Empty";
import { Glyph } from "@/components/ui/Glyph";
import { LinkKey } from "@/components/ui/LinkKey";
import { formatInstant } from "@/components/ui/formatDay";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { listCertificateReviews } from "@/lib/queries/listCertificateReviews";
import { listJudging } from "@/lib/queries/listJudging";
import { listQuestions } from "@/lib/queries/listQuestions";
import { listQueue } from "@/lib/queries/listQueue";
import { CertificateReviews } from "./_components/CertificateReviews";
import { JudgingList } from "./_components/JudgingList";
import { QuestionList } from "./_components/QuestionList";

export const metadata: Metadata = { title: "Queue" };

export default async function QueuePage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const actor = await requireActor(employer);
  const rows = await orNotFound(listQueue(actor));
  const certificates = await listCertificateReviews(actor);
  const judging = await listJudging(actor);
  const questions = await listQuestions(actor);
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Queue</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">What waits for a person, the longest wait first.</p>
      <CertificateReviews employer={employer} rows={certificates} />
      <JudgingList employer={employer} rows={judging} />
      <QuestionList employer={employer} rows={questions} />
      <section className="mt-8">
        <SectionHead title="To be decided" />
        {rows.length === 0 ? (
          <Empty title="No sitting waits for a decision">
            A sitting comes here when every check of it has its marking record, or its last day has passed.
          </Empty>
        ) : (
          <Table reflow caption="Sittings for decision">
            <thead>
              <tr>
                <Th>Sitting</Th>
                <Th>Technician</Th>
                <Th>Module</Th>
                <Th figure>Checks met</Th>
                <Th>Last marked</Th>
                <Th>State</Th>
                <Th />
              </tr>
            </thead>
            <tbody>
              {rows.map((row) => (
                <Tr key={row.sittingId}>
                  <RowHead>S-{row.number}</RowHead>
                  <Td label="Technician">{row.technician}</Td>
                  <Td label="Module">
                    {row.code} {row.title}
                  </Td>
                  <Td label="Checks met" figure>
                    {row.met} of {row.checks}
                  </Td>
                  <Td label="Last marked">{row.readyAt ? formatInstant(row.readyAt) : "–"}</Td>
                  <Td label="State">
                    <span className="flex items-center gap-2">
                      <Glyph name="awaiting" /> For decision
                      {row.questions > 0 && (row.questions === 1 ? ", 1 question" : `, ${row.questions} questions`)}
                    </span>
                  </Td>
                  <Td>
                    <LinkKey href={`/${employer}/queue/${row.sittingId}`} size="small">
                      Open the evidence
                    </LinkKey>
                  </Td>
                </Tr>
              ))}
            </tbody>
          </Table>
        )}
      </section>
    </div>
  );
}
