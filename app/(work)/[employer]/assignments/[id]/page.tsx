import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { ModuleTree } from "@/components/mdx/ModuleTree";
import { ChipStrip } from "@/components/ui/ChipStrip";
import { formatDay } from "@/components/ui/formatDay";
import { Ledger } from "@/components/ui/Ledger";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { WorkBar } from "@/components/ui/WorkBar";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { EXPOSURE_MONTHS, exposureLimit } from "@/lib/policies/exposure";
import { getAssignment } from "@/lib/queries/getAssignment";
import { StartSitting } from "./_components/StartSitting";
import { startSittingAction } from "./actions";

export const metadata: Metadata = { title: "Assignment" };

export default async function AssignmentPage({ params }: { params: Promise<{ employer: string; id: string }> }) {
  const { employer, id } = await params;
  const assignment = await orNotFound(getAssignment(await requireActor(employer), id));
  if (assignment.sittingId) redirect(`/${employer}/sittings/${assignment.sittingId}`);
  const { frontMatter, checks } = assignment;
  const minutes = checks.reduce((sum, check) => sum + check.minutes, 0);
  return (
    <>
      <WorkBar
        eyebrow={`Assigned by ${assignment.assignedBy}, due ${formatDay(assignment.dueOn)}`}
        title={`${assignment.code} ${assignment.title}`}
        facts={[
          { label: "Checks", value: String(checks.length) },
          { label: "Time in all", value: `${minutes} min` },
        ]}
      />
      <div className="page grid gap-x-14 gap-y-10 py-8 desk:grid-cols-[2fr_1fr]">
        <article className="min-w-0 bg-sheet px-6 py-6 tablet:px-10 tablet:py-8">
          <ModuleTree tree={assignment.tree} checkCards={assignment.checkCards} />
        </article>
        <aside className="grid content-start gap-8">
          <section aria-labelledby="start">
            <SectionHead title="The sitting" id="start" />
            {!assignment.feeSettled && (
              <Notice tone="caution" fact="The fee of this sitting is open." className="mt-4">
                You can read the module now. The sitting opens once your firm has settled the fee; you are mailed then.
              </Notice>
            )}
            <Ledger
              narrow
              className="mt-3"
              rows={[
                { label: "Days", value: `${frontMatter.sitting.days} from the start` },
                {
                  label: "Fresh cases",
                  value: `${frontMatter.sitting.freshCases} a check, after ${frontMatter.sitting.waitHours} h`,
                },
                {
                  label: "Cases of one kind",
                  value: `at most ${exposureLimit(frontMatter.sitting)} in ${EXPOSURE_MONTHS} months`,
                },
                { label: "Supervision", value: frontMatter.supervision },
                { label: "Aids", value: frontMatter.aids.join(", ") || "none" },
                { label: "Certificate", value: `${frontMatter.valid.months} months` },
              ]}
            />
            {assignment.isMine && assignment.feeSettled && (
              <StartSitting employer={employer} assignmentId={assignment.id} action={startSittingAction} />
            )}
          </section>
          <section aria-labelledby="release">
            <SectionHead title={`Release ${assignment.release}`} id="release" />
            <div className="mt-3 border-hair border-rule bg-sheet p-4">
              <ChipStrip fingerprint={assignment.fingerprint} width={320} />
            </div>
            <p className="mt-2 text-label font-normal text-ink-2">
              The release you will sit. Later releases change nothing here.
            </p>
          </section>
        </aside>
      </div>
    </>
  );
}
