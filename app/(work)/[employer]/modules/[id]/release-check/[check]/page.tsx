import type { Metadata } from "next";
import { GivenPane } from "@/components/checks/GivenPane";
import { RecordTable } from "@/components/checks/RecordTable";
import { Workspace } from "@/components/checks/Workspace";
import { formatNumber } from "@/components/ui/formatNumber";
import { Ledger } from "@/components/ui/Ledger";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { WorkBar } from "@/components/ui/WorkBar";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getFailingCase, type FailingCaseView } from "@/lib/queries/getFailingCase";

export const metadata: Metadata = { title: "Case of the release check" };

type Props = {
  params: Promise<{ employer: string; id: string; check: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

/** A case that nobody sits, as its technician would see it, with what is true of it and how the tried hand-in was marked. */
export default async function FailingCasePage({ params, searchParams }: Props) {
  const { employer, id, check } = await params;
  const asked = await searchParams;
  const {
    line = "",
    n,
    hand,
  } = Object.fromEntries(Object.entries(asked).map(([name, value]) => [name, String(value)]));
  const actor = await requireActor(employer);
  const tried = { checkId: check, line, n: Number(n), hand: Number(hand) };
  const shown = await orNotFound(getFailingCase(actor, id, tried));
  return (
    <>
      <WorkBar
        eyebrow={`Release check of ${shown.code}, ${shown.title}`}
        title={`Case ${shown.n + 1}: ${shown.label}`}
        keys={<LinkKey href={`/${employer}/modules/${id}/release-check`}>Back to the release check</LinkKey>}
      />
      <div className="page grid gap-x-14 gap-y-10 py-7 desk:grid-cols-[minmax(0,1fr)_21.5rem]">
        <div className="grid min-w-0 content-start gap-10">
          <p className="max-w-measure text-dense">
            This case follows from the text of the check. It is made for looking at and nobody is given it in a sitting.
          </p>
          {shown.fault && (
            <Notice tone="minus" fact="No case could be built.">
              {shown.fault}
            </Notice>
          )}
          <Marked shown={shown} />
          {shown.view && !shown.worksFromFiles && (
            <section aria-labelledby="work" className="min-w-0">
              <SectionHead title="As the technician sees it" id="work" />
              <div className="mt-4">
                <Workspace view={shown.view} filesAddress="" />
              </div>
            </section>
          )}
          {shown.worksFromFiles && (
            <p className="text-dense text-ink-2">
              What is worked on here is a file, and none is made for looking at it. A sitting has it.
            </p>
          )}
        </div>
        <aside className="grid min-w-0 content-start gap-7">
          {shown.view && <GivenPane open={{ view: shown.view, files: [] }} filesAddress="" />}
          <Truth shown={shown} />
        </aside>
      </div>
    </>
  );
}

function Marked({ shown: { marking, view } }: { shown: FailingCaseView }) {
  if (!marking) {
    return view ? (
      <p className="text-dense">Its hand-in needs the samples, which are not made for looking at it.</p>
    ) : null;
  }
  return (
    <section aria-labelledby="marked" className="min-w-0">
      <SectionHead title="The hand-in that was tried" id="marked" note={marking.met ? "met" : "not met"} />
      <div className="mt-3">
        <RecordTable rows={marking.rows} />
      </div>
    </section>
  );
}

function Truth({ shown: { difficulty, truth } }: { shown: FailingCaseView }) {
  if (truth === "") return null;
  const figures = (value: number) => formatNumber(value, Number.isInteger(value) ? 0 : 3);
  return (
    <section aria-labelledby="truth">
      <SectionHead title="What is true of it" id="truth" />
      <Ledger
        narrow
        className="mt-3"
        rows={difficulty.map(({ label, unit, value, from, to }) => ({
          label,
          value: `${figures(value)}${unit === "1" ? "" : `\u00a0${unit}`}; fair is ${figures(from)} to ${figures(to)}`,
        }))}
      />
      <details className="mt-4">
        <summary className="cursor-pointer py-1 text-dense font-semibold pointer-coarse:py-2.5">All of it</summary>
        <pre
          tabIndex={0}
          role="region"
          aria-label="What is true of this case"
          className="mt-2 max-h-[30rem] overflow-auto bg-sheet p-3 font-code text-[0.8125rem]"
        >
          {truth}
        </pre>
      </details>
    </section>
  );
}
