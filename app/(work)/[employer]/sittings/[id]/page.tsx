import type { Metadata } from "next";
import { ModuleTree } from "@/components/mdx/ModuleTree";
import { SittingStateWord } from "@/components/sittings/SittingStateWord";
import { ChipStrip } from "@/components/ui/ChipStrip";
import { formatDay, formatInstant } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { WorkBar } from "@/components/ui/WorkBar";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getSitting, type SittingView } from "@/lib/queries/getSitting";
import { CheckRow } from "./_components/CheckRow";
import { openCaseAction } from "./actions";

export const metadata: Metadata = { title: "Sitting" };

export default async function SittingPage({ params }: { params: Promise<{ employer: string; id: string }> }) {
  const { employer, id } = await params;
  const sitting = await orNotFound(getSitting(await requireActor(employer), id));
  const met = sitting.checks.filter((check) => check.met).length;
  const undecided = sitting.state === "sitting" || sitting.state === "for decision";
  return (
    <>
      <WorkBar
        eyebrow={`Sitting S-${sitting.number}${sitting.isMine ? "" : `, ${sitting.technician}`}, release ${sitting.release}`}
        title={`${sitting.code} ${sitting.title}`}
        facts={[
          { label: "Checks met", value: `${met} of ${sitting.checks.length}` },
          { label: "Last day", value: formatDay(sitting.lastDay) },
        ]}
      >
        <SittingStateWord state={sitting.state} />
      </WorkBar>
      <div className="page grid gap-x-14 gap-y-10 py-8 desk:grid-cols-[2fr_1fr]">
        <div className="min-w-0">
          <Outcome employer={employer} sitting={sitting} />
          <section aria-labelledby="checks">
            <SectionHead title="Practical checks" id="checks" note="open one when you have the time for it" />
            <ul>
              {sitting.checks.map((check) => (
                <CheckRow
                  key={check.plan.id}
                  employer={employer}
                  sittingId={sitting.id}
                  check={check}
                  freshCases={sitting.frontMatter.sitting.freshCases}
                  mayOpen={sitting.isMine && undecided}
                  open={openCaseAction}
                />
              ))}
            </ul>
          </section>
          <details className="mt-8 border-t-hair border-rule-strong pt-4">
            <summary className="plate cursor-pointer py-1 text-h3 pointer-coarse:py-2.5">
              The module&rsquo;s text
            </summary>
            <article className="mt-4 bg-sheet px-6 py-6 tablet:px-10">
              <ModuleTree tree={sitting.tree} checkCards={sitting.checkCards} />
            </article>
          </details>
        </div>
        <aside>
          <SectionHead title={`Release ${sitting.release}`} />
          <div className="mt-3 border-hair border-rule bg-sheet p-4">
            <ChipStrip fingerprint={sitting.fingerprint} width={320} />
          </div>
          <p className="mt-2 text-label font-normal text-ink-2">Later releases change nothing here.</p>
        </aside>
      </div>
    </>
  );
}

function Outcome({ employer, sitting }: { employer: string; sitting: SittingView }) {
  if (sitting.state === "for decision") {
    return (
      <Notice tone="plus" fact="The marking is done." className="mb-7">
        The sitting waits for a decider.
        {sitting.isMine && sitting.checks.some((check) => !check.met && check.next.state === "available")
          ? " A fresh case of a check that is not met may still be opened before the decision."
          : ""}
      </Notice>
    );
  }
  if (!sitting.outcome) return null;
  const decided = `${sitting.decider}, ${formatInstant(sitting.decidedAt!)}.`;
  return (
    <Notice
      tone={sitting.outcome === "competent" ? "plus" : "minus"}
      fact={sitting.outcome === "competent" ? "Decided: competent." : "Decided: not yet competent."}
      className="mb-7"
      action={
        sitting.certificate && (
          <LinkKey href={`/${employer}/certificates/${sitting.certificate}`}>Open the certificate</LinkKey>
        )
      }
    >
      {decided} {sitting.decisionReason}
      {sitting.outcome === "competent" && !sitting.certificate && " The certificate is being issued."}
      {sitting.outcome !== "competent" && " A new sitting can be assigned."}
    </Notice>
  );
}
