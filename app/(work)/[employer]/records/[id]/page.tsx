import type { Metadata } from "next";
import { RecordSide } from "./_components/RecordSide";
import { QuantityLine } from "@/components/checks/QuantityLine";
import { RecordTable } from "@/components/checks/RecordTable";
import { SittingStateWord } from "@/components/sittings/SittingStateWord";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { WorkBar } from "@/components/ui/WorkBar";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getMarkingRecord } from "@/lib/queries/getMarkingRecord";
import { answerQuestionAction, askQuestionAction } from "./actions";

export const metadata: Metadata = { title: "Marking record" };

type Props = { params: Promise<{ employer: string; id: string }>; searchParams: Promise<{ of?: string | string[] }> };

export default async function RecordPage({ params, searchParams }: Props) {
  const { employer, id } = await params;
  const { of } = await searchParams;
  const sequence = typeof of === "string" && /^[1-9]\d{0,5}$/.test(of) ? Number(of) : null;
  const record = await orNotFound(getMarkingRecord(await requireActor(employer), id, sequence));
  const { quantities, withinCount, needs } = record;
  const critical = quantities.some((quantity) => quantity.critical);
  return (
    <>
      <WorkBar
        eyebrow={`Marking record, sitting S-${record.sittingNumber}, case ${record.caseNumber} of ${record.freshCases + 1}${record.isMine ? "" : `, ${record.technician}`}`}
        title={`${record.code} ${record.checkTitle}`}
        facts={[
          { label: "Within tolerance", value: <Of count={withinCount} all={quantities.length} /> },
          {
            label: "Needed",
            value: <Of count={needs} all={quantities.length} rest={critical ? ", all critical" : ""} />,
          },
          { label: "Check", value: <strong className="font-bold">{record.met ? "Met" : "Not met"}</strong> },
        ]}
        keys={<SittingStateWord state={record.sittingState} />}
      />
      <div className="page grid gap-x-6 gap-y-8 py-5 desk:grid-cols-[1fr_21.5rem]">
        <div className="min-w-0">
          {record.sequence < record.records[0]!.sequence && (
            <Notice
              tone="caution"
              fact="A later record follows this one."
              className="mb-5"
              action={<LinkKey href={`/${employer}/records/${id}`}>Open the newest</LinkKey>}
            >
              The case was marked again; what it says now is there.
            </Notice>
          )}
          <RecordTable rows={record.rows} />
          <div className="flex flex-wrap items-center gap-6 border-t-strong border-ink bg-sheet px-4 py-4">
            <QuantityLine quantities={quantities} />
            <p className="font-semibold">
              {withinCount} within, {quantities.length - withinCount} outside. The release asks for {needs}
              {critical ? ", every critical one among them" : ""}.
            </p>
          </div>
          <div className="mt-6">
            <LinkKey href={`/${employer}/sittings/${record.sittingId}`}>Back to the sitting</LinkKey>
          </div>
        </div>
        <RecordSide employer={employer} record={record} ask={askQuestionAction} answer={answerQuestionAction} />
      </div>
    </>
  );
}

function Of({ count, all, rest = "" }: { count: number; all: number; rest?: string }) {
  return (
    <>
      <strong className="font-bold">{count}</strong> of {all}
      {rest}
    </>
  );
}
