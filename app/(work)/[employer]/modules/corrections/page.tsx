import type { Metadata } from "next";
import { Empty } from "@/components/ui/Empty";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { listCorrections } from "@/lib/queries/listCorrections";
import { ReviewState } from "./_components/ReviewState";
import { StartReview } from "./_components/StartReview";
import { reviewMarkingAction } from "./actions";

export const metadata: Metadata = { title: "Corrected markings" };

export default async function CorrectionsPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const corrections = await orNotFound(listCorrections(await requireActor(employer)));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Corrected markings</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        New hand-ins are marked by the newest marking. What was marked before stays as it is until you say otherwise.
      </p>
      {corrections.length === 0 && (
        <div className="mt-6">
          <Empty
            title="No marking has been corrected"
            action={<LinkKey href={`/${employer}/modules`}>Back to the modules</LinkKey>}
          >
            When one is, you can hold it here against the records of your firm.
          </Empty>
        </div>
      )}
      {corrections.map(({ marking, title, reason, older, review }) => (
        <section key={marking} className="mt-8">
          <SectionHead title={title} note={marking} />
          <p className="mt-3 max-w-measure">{reason}</p>
          {review && <ReviewState employer={employer} review={review} />}
          {!review && older > 0 && (
            <StartReview employer={employer} marking={marking} older={older} action={reviewMarkingAction} />
          )}
          {!review && older === 0 && (
            <p className="mt-3 text-dense text-ink-2">Your firm has no record of an older marking.</p>
          )}
        </section>
      ))}
    </div>
  );
}
