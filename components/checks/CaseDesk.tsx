"use client";
import { useRouter } from "next/navigation";
import { useCallback, useState, type ReactNode } from "react";
import type { Reading } from "@/components/calculators/reading";
import { Key } from "@/components/ui/Key";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { SavedState } from "@/components/ui/SavedState";
import { FootSteps, Steps, type Step } from "@/components/ui/Steps";
import { TimeLeft } from "@/components/ui/TimeLeft";
import { WorkBar } from "@/components/ui/WorkBar";
import type { OpenCaseView } from "@/lib/queries/getCase";
import { AnswerForm } from "./AnswerForm";
import { askedFields, countGiven } from "./formFields";
import { GivenPane } from "./GivenPane";
import { HandInDialog } from "./HandInDialog";
import { TakenLine } from "./TakenLine";
import { takeReading, type Taken } from "./takeReading";
import { useAnswers, type Saved } from "./useAnswers";
import { Workspace } from "./Workspace";

const STEPS = [
  { id: "brief", label: "Brief" },
  { id: "search", label: "Work" },
  { id: "answers", label: "Answers" },
] as const;
type StepId = (typeof STEPS)[number]["id"];

/** An open case: what is given, the work, the answers. Side by side on a desk, steps on a phone. */
export function CaseDesk({
  employer,
  open,
  brief,
}: {
  employer: string;
  open: Omit<OpenCaseView, "brief"> & { view: NonNullable<OpenCaseView["view"]> };
  /** What the lead wrote inside the check, drawn by the page. */
  brief?: ReactNode;
}) {
  const router = useRouter();
  const base = `/api/employers/${employer}/cases/${open.id}`;
  const [over, setOver] = useState(false);
  const { answers, saved, change, send, forget } = useAnswers({
    caseId: open.id,
    address: `${base}/answers`,
    server: { answers: open.answers, revision: open.revision, savedAt: open.savedAt },
    closed: over,
  });
  const [step, setStep] = useState<StepId>("search");
  const [handing, setHanding] = useState(false);
  const [openField, setOpenField] = useState<string | null>(null);
  const [taken, setTaken] = useState<readonly Taken[] | null>(null);
  const fields = askedFields(open.view.sections, answers);
  const given = countGiven(fields, answers);
  const missing = fields.length - given;

  const take = useCallback(
    (reading: Reading) => {
      const written = takeReading(open.view.sections, answers, reading, openField);
      setTaken(written);
      if (written.length > 0) change(Object.fromEntries(written.map(({ id, value }) => [id, value])));
    },
    [answers, change, open.view.sections, openField],
  );
  const end = useCallback(() => {
    void send();
    setOver(true);
    // The clock hands in what was saved half a minute later; the page then shows the marking.
    setTimeout(() => router.refresh(), 35_000);
  }, [router, send]);
  const handedIn = () => {
    forget();
    setHanding(false);
    router.refresh();
  };
  const steps: Step[] = STEPS.map(({ id, label }) => ({ id, label, state: id === step ? "current" : "todo" }));
  return (
    <div className="flex flex-1 flex-col desk:flex-none desk:h-[calc(100dvh-63px-var(--banner,0px))]">
      <WorkBar
        eyebrow={`Sitting S-${open.sittingNumber}, case ${open.number} of ${open.ofCases}`}
        title={`${open.code} ${open.view.title}`}
      >
        <div className="hidden tablet:block desk:hidden">
          <Steps label="Steps of this case" steps={steps} />
        </div>
        <SavedState {...savedWords(saved)} />
        <TimeLeft
          endsAt={open.endsAt!}
          serverNow={open.serverNow}
          minutes={(Date.parse(open.endsAt!) - Date.parse(open.openedAt!)) / 60_000}
          onEnd={end}
        />
      </WorkBar>
      <div className="grid min-h-0 flex-1 pb-[68px] desk:grid-cols-[17.5rem_1fr_25rem] desk:pb-0">
        <Pane id="brief" current={step} className="bg-ground">
          <GivenPane open={open} filesAddress={`${base}/files`} brief={brief} />
        </Pane>
        <Pane id="search" current={step} className="border-rule bg-sheet desk:border-x-hair">
          <Workspace view={open.view} filesAddress={`${base}/files`} onTake={over ? undefined : take} />
          <TakenLine taken={taken} kind={open.view.kind} />
        </Pane>
        <Pane id="answers" current={step} className="bg-ground">
          <div className="flex items-baseline justify-between gap-4 border-b-strong border-ink pb-2">
            <h2 className="text-h3">Answers</h2>
            <span className="text-dense text-ink-2 figures">
              {given} of {fields.length} given
            </span>
          </div>
          {over && (
            <Notice tone="caution" fact="Time is over." live className="my-3">
              What was saved is handed in by the clock. The marking follows.
            </Notice>
          )}
          <fieldset disabled={over} className="grid gap-px">
            <AnswerForm sections={open.view.sections} answers={answers} onChange={change} onEnter={setOpenField} />
          </fieldset>
        </Pane>
      </div>
      <div className="hidden items-center justify-between gap-6 border-t-hair border-rule-strong bg-sheet px-(--margin) py-2.5 desk:flex">
        <p className="flex items-center gap-5 text-dense text-ink-2">
          <LinkKey href={`/${employer}/sittings/${open.sittingId}`}>Back to the sitting</LinkKey>
          You can leave and come back. The time goes on.
        </p>
        <p className="flex items-center gap-5 text-dense text-ink-2 figures">
          {missing > 0 && (missing === 1 ? "1 answer missing" : `${missing} answers missing`)}
          <Key onClick={() => setHanding(true)} reason={over ? "Time is over." : null}>
            Review and hand in
          </Key>
        </p>
      </div>
      <div className="desk:hidden">
        <FootSteps
          label="Steps of this case"
          steps={[...steps, { id: "hand-in", label: "Hand in", state: "todo" }]}
          onGo={(id) => (id === "hand-in" ? setHanding(true) : setStep(id as StepId))}
        />
      </div>
      <HandInDialog
        open={handing && !over}
        onClose={() => setHanding(false)}
        address={`${base}/hand-in`}
        fields={fields}
        answers={answers}
        onHandedIn={handedIn}
      />
    </div>
  );
}

type PaneProps = { id: StepId; current: StepId; className: string; children: React.ReactNode };

/** Scrolls by itself on a desk; on a phone only the pane of the current step is there. */
function Pane({ id, current, className, children }: PaneProps) {
  const label = { brief: "Given", search: "Work", answers: "Answers" }[id];
  return (
    <section
      aria-label={label}
      tabIndex={0}
      className={`${id === current ? "block" : "hidden"} relative min-h-0 min-w-0 overflow-y-auto p-4 desk:block desk:px-6 desk:py-5 ${className}`}
    >
      {children}
    </section>
  );
}

function savedWords({ state, at, since, why }: Saved) {
  if (state === "kept") {
    return { state, where: `No signal since ${since}, sends by itself` } as const;
  }
  if (state === "not-saved") return { state, where: why ?? undefined } as const;
  return {
    state,
    at: at ?? undefined,
    where: at ? (why ?? "On this device and at the server") : "Nothing answered yet",
  } as const;
}
