import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { ModuleTree } from "@/components/mdx/ModuleTree";
import { formatInstant } from "@/components/ui/formatDay";
import { SectionHead } from "@/components/ui/SectionHead";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getJudging } from "@/lib/queries/getJudging";
import { JudgingForm } from "./_components/JudgingForm";
import { judgeWrittenAction } from "./actions";

export const metadata: Metadata = { title: "To be judged" };

export default async function JudgingPage({ params }: { params: Promise<{ employer: string; case: string }> }) {
  const { employer, case: id } = await params;
  const judging = await orNotFound(getJudging(await requireActor(employer), id));
  if (judging.isJudged) redirect(`/${employer}/records/${id}`);
  return (
    <div className="page max-w-[860px] py-8 desk:py-10">
      <p className="text-label font-normal text-ink-2">
        Sitting S-{judging.sittingNumber}, case {judging.caseNumber}, handed in {formatInstant(judging.handedInAt)}
        {judging.byClock && " by the clock"}
      </p>
      <h1 className="text-h1">
        {judging.technician}, {judging.checkTitle}
      </h1>
      <p className="mt-1 text-dense text-ink-2">
        {judging.code} {judging.moduleTitle}
      </p>
      {judging.brief && (
        <section className="mt-7">
          <SectionHead title="Brief" />
          <div className="mt-3">
            <ModuleTree tree={judging.brief} />
          </div>
        </section>
      )}
      {judging.words.trim() !== "" && (
        <section className="mt-7">
          <SectionHead title="In the technician’s words" />
          <p className="mt-2 max-w-measure whitespace-pre-line">{judging.words}</p>
        </section>
      )}
      <JudgingForm
        employer={employer}
        caseId={judging.caseId}
        technician={judging.technician}
        lines={judging.lines}
        judge={judgeWrittenAction}
      />
    </div>
  );
}
