import type { Metadata } from "next";
import { formatDay, formatInstant } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getDecisionDesk, type DecisionDeskView } from "@/lib/queries/getDecisionDesk";
import { confirmPasswordAction } from "@/lib/auth/actions";
import { DecisionForm } from "./_components/DecisionForm";
import { Exhibit } from "./_components/Exhibit";
import { OutsideRows } from "./_components/OutsideRows";
import { ReleasedOutsideList } from "@/components/checks/ReleasedOutsideList";
import { QuantityLine } from "@/components/checks/QuantityLine";
import { SittingLog } from "./_components/SittingLog";
import { decideAction } from "./actions";

export const metadata: Metadata = { title: "Decision" };

type Props = { params: Promise<{ employer: string; sitting: string }> };

export default async function DecisionPage({ params }: Props) {
  const { employer, sitting: id } = await params;
  const desk = await orNotFound(getDecisionDesk(await requireActor(employer), id));
  const { sitting } = desk;
  return (
    <div className="desk:grid desk:min-h-full desk:grid-cols-[63fr_37fr]">
      <div className="px-(--margin) py-7">
        <p className="text-label font-normal text-ink-2">
          Sitting S-{sitting.number}, started {formatInstant(sitting.startedAt)}, last day {formatDay(sitting.lastDay)}
        </p>
        <h1 className="text-h1">
          {sitting.technician}, {sitting.code} {sitting.title}
        </h1>
        {desk.exposureNote && (
          <Notice tone="caution" fact="Assigned beyond the limit on cases of one kind." className="mt-4">
            The lead wrote: {desk.exposureNote}
          </Notice>
        )}
        {desk.isMarkedAgain && (
          <Notice tone="caution" fact="Marked again after the decision." className="mt-4">
            The decision stands on the earlier records; each record below leads to the one before it.
          </Notice>
        )}
        <MarkingExhibit employer={employer} desk={desk} />
        <Exhibit number={2} title="The quantities outside" note={outsideNote(desk)}>
          <OutsideRows records={desk.records} checks={sitting.checks} />
        </Exhibit>
        <Exhibit number={3} title="In the technician’s words" note="asked on hand-in, and questions put to the record">
          <Words desk={desk} />
        </Exhibit>
        <Exhibit number={4} title="Sitting log" note="identity not confirmed by a person">
          <SittingLog records={desk.records} checks={sitting.checks} />
        </Exhibit>
        {desk.releasedOutside.length > 0 && (
          <Exhibit number={5} title="Released outside a bound" note="of the release check, with the lead’s reason">
            <ReleasedOutsideList outside={desk.releasedOutside} />
          </Exhibit>
        )}
      </div>
      <aside className="border-ink bg-sheet px-(--margin) py-7 desk:border-l-strong">
        <Decision employer={employer} desk={desk} />
      </aside>
    </div>
  );
}

function MarkingExhibit({ employer, desk }: { employer: string; desk: DecisionDeskView }) {
  const { checks, frontMatter } = desk.sitting;
  const met = checks.filter((check) => check.met).length;
  const some = frontMatter.require.some;
  const needed = `all of ${frontMatter.require.all.length} required checks${some ? `, and ${some.count} of ${some.of.length} more` : ""}`;
  return (
    <Exhibit number={1} title="Marking records" note={`${met} of ${checks.length} checks met; needed: ${needed}`}>
      <div className="grid gap-4">
        {desk.records.map((record) => {
          const plan = checks.find((check) => check.plan.id === record.checkId)!.plan;
          return (
            <div key={record.caseId} className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
              <div className="min-w-0 flex-1 basis-72">
                <p className="text-dense">
                  <strong className="font-semibold">{plan.title}</strong>
                  {record.caseNumber > 1 && `, case ${record.caseNumber}`}: {record.withinCount} of{" "}
                  {record.quantities.length} quantities within, {record.needs} needed,{" "}
                  <strong className="font-semibold">{record.met ? "met" : "not met"}</strong>
                </p>
                <QuantityLine quantities={record.quantities} />
              </div>
              <LinkKey href={`/${employer}/records/${record.caseId}`} size="small">
                Open the record
              </LinkKey>
            </div>
          );
        })}
        {desk.records.length === 0 && <p className="text-dense text-ink-2">No case was handed in.</p>}
      </div>
    </Exhibit>
  );
}

function Words({ desk }: { desk: DecisionDeskView }) {
  const said = desk.records.filter((record) => record.words.trim() !== "");
  if (said.length === 0 && desk.questions.length === 0) {
    return <p className="text-dense text-ink-2">Nothing was said, and no quantity was questioned.</p>;
  }
  return (
    <div className="grid gap-3">
      {said.map((record) => (
        <blockquote key={record.caseId} className="max-w-measure whitespace-pre-line">
          “{record.words}”
        </blockquote>
      ))}
      {desk.questions.map((question) => (
        <p key={question.askedAt} className="max-w-measure">
          <strong className="font-semibold">Question, {question.quantity}:</strong> {question.words}{" "}
          <span className="text-dense text-ink-2">{formatInstant(question.askedAt)}</span>
          {question.answer && <span className="block whitespace-pre-line">Answer: {question.answer}</span>}
        </p>
      ))}
    </div>
  );
}

function Decision({ employer, desk }: { employer: string; desk: DecisionDeskView }) {
  const { sitting, bars, decidability } = desk;
  if (sitting.outcome) {
    return (
      <>
        <h2 className="text-h2">Decided: {sitting.outcome}</h2>
        <p className="mt-2 text-dense text-ink-2">
          By {sitting.decider}, {formatInstant(sitting.decidedAt!)}
        </p>
        <p className="mt-4 whitespace-pre-line">{sitting.decisionReason}</p>
        {sitting.certificate ? (
          <div className="mt-6">
            <LinkKey href={`/${employer}/register/${sitting.certificate}`}>
              Open certificate {sitting.certificate}
            </LinkKey>
          </div>
        ) : (
          sitting.outcome === "competent" && (
            <p className="mt-4 text-dense text-ink-2">The certificate is being issued.</p>
          )
        )}
      </>
    );
  }
  return (
    <>
      <h2 className="text-h2">Your decision</h2>
      {!desk.mayDecide && (
        <Notice tone="caution" fact="You may read this and not decide it." className="mt-4">
          A decider of the firm does.
        </Notice>
      )}
      {desk.mayDecide && bars.length > 0 && (
        <Notice tone="minus" fact="You cannot decide on this sitting." className="mt-4">
          {bars.join(" ")} Another decider has to.
        </Notice>
      )}
      {desk.mayDecide && !decidability.decidable && (
        <Notice tone="caution" fact="This sitting is not ready." className="mt-4">
          {decidability.reason}
        </Notice>
      )}
      {desk.mayDecide && bars.length === 0 && decidability.decidable && (
        <DecisionForm
          employer={employer}
          sittingId={sitting.id}
          technician={sitting.technician}
          title={`${sitting.code} ${sitting.title}`}
          months={sitting.frontMatter.valid.months}
          requirementMet={decidability.requirementMet}
          outsideLine={desk.outsideLine}
          decide={decideAction}
          confirmPassword={confirmPasswordAction}
        />
      )}
    </>
  );
}

function outsideNote({ records }: DecisionDeskView): string {
  const count = records.flatMap((record) => record.rows).filter((row) => !row.within).length;
  return count === 0 ? "none" : count === 1 ? "one line" : `${count} lines`;
}
