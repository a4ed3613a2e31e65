import Link from "next/link";
import type { FormAction } from "@/components/ui/actionResult";
import { ChipStrip } from "@/components/ui/ChipStrip";
import { formatInstant } from "@/components/ui/formatDay";
import { Ledger } from "@/components/ui/Ledger";
import { SectionHead } from "@/components/ui/SectionHead";
import type { MarkingRecordView } from "@/lib/queries/getMarkingRecord";
import { AskQuestion } from "./AskQuestion";
import { Questions } from "./Questions";

/** How it was computed, from which release, and what to do if one disagrees. */
export function RecordSide({
  employer,
  record,
  ask,
  answer,
}: {
  employer: string;
  record: MarkingRecordView;
  ask: FormAction;
  answer: FormAction;
}) {
  const undecided = record.sittingState === "sitting" || record.sittingState === "for decision";
  return (
    <aside className="grid content-start gap-7">
      <section>
        <SectionHead title={record.judge ? "Who judged this" : "How this was computed"} />
        <Ledger
          narrow
          rows={[
            {
              label: "Handed in",
              value: `${formatInstant(record.handedInAt, { seconds: true })}${record.byClock ? ", by the clock" : ""}`,
            },
            { label: record.judge ? "Judged" : "Computed", value: formatInstant(record.markedAt, { seconds: true }) },
            { label: "By", value: record.judge ?? `${record.marking}, engine ${record.engineVersion}` },
            ...(record.captureSha256
              ? [
                  {
                    label: "Capture",
                    value: <code className="font-code text-[0.8125rem]">{record.captureSha256.slice(0, 12)}</code>,
                  },
                ]
              : []),
            ...(record.judge ? [] : [{ label: "Time taken", value: `${(record.durationMs / 1000).toFixed(2)} s` }]),
          ]}
        />
        {record.sequence > 1 && <p className="mt-3 text-dense">Marked again: {record.reason}</p>}
        {record.records.length > 1 && (
          <ul className="mt-3 grid gap-1 text-dense">
            {record.records.map(({ sequence, marking, met, markedAt }) => (
              <li key={sequence}>
                {sequence === record.sequence ? (
                  <strong className="font-semibold">Record {sequence}</strong>
                ) : (
                  <Link className="link" href={`/${employer}/records/${record.caseId}?of=${sequence}`}>
                    Record {sequence}
                  </Link>
                )}
                : {met ? "met" : "not met"}, {marking}, {formatInstant(markedAt)}
              </li>
            ))}
          </ul>
        )}
        {!record.judge && <Workings lines={record.workings} />}
      </section>
      {record.words && (
        <section>
          <SectionHead title="In the technician’s words" />
          <p className="mt-2 whitespace-pre-line">{record.words}</p>
        </section>
      )}
      <section>
        <SectionHead title={`Module release ${record.release}`} />
        <div className="mt-3 border-hair border-rule bg-sheet p-4">
          <ChipStrip fingerprint={record.fingerprint} width={310} />
        </div>
        <p className="mt-2 text-label font-normal text-ink-2">
          The release that was sat. Later releases change nothing here.
        </p>
      </section>
      <section>
        <SectionHead title="If you disagree" />
        <Questions employer={employer} record={record} answer={answer} />
        {record.isMine && undecided ? (
          <AskQuestion employer={employer} recordId={record.id} quantities={record.quantities} action={ask} />
        ) : (
          <p className="mt-2 text-dense text-ink-2">
            {record.isMine ? "The sitting is decided. " : ""}An appeal goes to people who had no part in it;{" "}
            <Link className="link" href="/impartiality">
              the procedure is public
            </Link>
            .
          </p>
        )}
      </section>
    </aside>
  );
}

function Workings({ lines }: { lines: MarkingRecordView["workings"] }) {
  return (
    <>
      <details className="mt-3">
        <summary className="cursor-pointer py-1 text-dense font-semibold pointer-coarse:py-3">Workings</summary>
        <dl className="mt-2">
          {lines.map((line, index) => (
            <div key={index} className="border-b-hair border-rule py-1.5 text-dense figures">
              <dt className="text-ink-2">{line.label}</dt>
              <dd>{line.value}</dd>
            </div>
          ))}
        </dl>
      </details>
      <p className="mt-3 text-dense text-ink-2">
        The same case and engine give the same numbers. This case is not used again, so all of it is shown.
      </p>
    </>
  );
}
