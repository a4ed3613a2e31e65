"use client";
import Link from "next/link";
import type { EditorView } from "@codemirror/view";
import type { ReactCodeMirrorRef } from "@uiw/react-codemirror";
import { useCallback, useEffect, useRef, useState } from "react";
import { ModuleTree } from "@/components/mdx/ModuleTree";
import type { FormAction } from "@/components/ui/actionResult";
import { Key } from "@/components/ui/Key";
import { KeyCap } from "@/components/ui/KeyCap";
import { Notice } from "@/components/ui/Notice";
import { SavedState } from "@/components/ui/SavedState";
import { TwoWay } from "@/components/ui/TwoWay";
import { WorkBar } from "@/components/ui/WorkBar";
import type { Problem } from "@/lib/mdx/problem";
import type { DraftReading } from "@/lib/queries/checkDraft";
import type { ModuleView } from "@/lib/queries/getModule";
import { ProblemStrip } from "./ProblemStrip";
import { ReleaseDialog } from "./ReleaseDialog";
import { offsetOf, SourceEditor } from "./SourceEditor";
import { useDraft } from "./useDraft";

type ModuleDeskProps = {
  employer: string;
  draft: ModuleView;
  reading: DraftReading;
  release: FormAction;
};

/** Source and preview side by side, problems under both; on a phone one of the two. */
export function ModuleDesk({ employer, draft, reading: first, release }: ModuleDeskProps) {
  const editor = useRef<ReactCodeMirrorRef>(null);
  const { source, reading, checking, saved, change, save } = useDraft({
    base: `/api/employers/${employer}/modules/${draft.id}`,
    source: draft.source,
    title: draft.title,
    revision: draft.revision,
    savedAt: draft.savedAt,
    reading: first,
  });
  const [cursor, setCursor] = useState({ line: 1, column: 1 });
  const [shown, setShown] = useState<"source" | "preview">("source");
  const [releasing, setReleasing] = useState(false);
  const errors = reading.problems.filter(({ severity }) => severity === "error");
  const last = draft.releases[0];
  const unchanged = last?.isDraft === true && source === draft.source;

  const goTo = useCallback((line: number, column: number) => {
    setShown("source");
    const view = editor.current?.view;
    if (!view) return;
    view.dispatch({ selection: { anchor: offsetOf(view, line, column) }, scrollIntoView: true });
    view.focus();
  }, []);
  const repair = (problem: Problem) => {
    const view = editor.current?.view;
    if (view && problem.repair) applyRepair(view, problem.repair);
  };
  useNextProblemKey(reading.problems, cursor, goTo);

  const reason =
    errors.length > 0
      ? `${errors.length === 1 ? "1 error" : `${errors.length} errors`} to fix first`
      : unchanged
        ? `Nothing changed since ${last.number}`
        : saved.state === "saved" && !checking
          ? null
          : "Saving first";
  return (
    <div className="flex flex-1 flex-col desk:flex-none desk:h-[calc(100dvh-63px-var(--banner,0px))]">
      <WorkBar
        eyebrow={last ? `Draft after release ${last.number}` : "Draft, never released"}
        title={`${draft.code} ${reading.title ?? draft.title}`}
        keys={
          <Key variant="filled" reason={reason} onClick={() => setReleasing(true)}>
            Release…
          </Key>
        }
      >
        <SavedState
          state={saved.state}
          at={saved.state === "saved" ? (saved.at ?? undefined) : undefined}
          where={saved.why ?? "At the server, not released"}
        />
        <Link className="link text-dense" href={`/${employer}/modules/${draft.id}/release-check`}>
          Release check
        </Link>
        {last && (
          <Link className="link text-dense" href={`/${employer}/modules/${draft.id}/releases/${last.number}`}>
            Release {last.number}
          </Link>
        )}
        <div className="desk:hidden">
          <TwoWay
            name="shown"
            label="What is shown"
            choices={[
              { value: "source", label: "Source" },
              { value: "preview", label: "Preview" },
            ]}
            value={shown}
            onChange={(value) => setShown(value as typeof shown)}
          />
        </div>
      </WorkBar>
      <div className="grid min-h-0 flex-1 desk:grid-cols-2">
        <section
          aria-label="Source"
          className={`min-h-0 min-w-0 flex-col bg-sheet desk:flex ${shown === "source" ? "flex" : "hidden"}`}
        >
          <p className="flex flex-wrap items-center justify-between gap-3 border-b-hair border-rule bg-well px-(--margin) py-2 text-dense">
            <span>
              <strong className="font-code">module.mdx</strong>{" "}
              <span className="ml-3 text-ink-2 figures">
                Line {cursor.line}, column {cursor.column}
              </span>
            </span>
            <span className="flex items-center gap-2 text-ink-2">
              <KeyCap>Alt</KeyCap>
              <KeyCap>N</KeyCap> next problem
              <span className="hidden items-center gap-2 pl-3 tablet:flex">
                <KeyCap>Ctrl</KeyCap>
                <KeyCap>Space</KeyCap> names and units
              </span>
            </span>
          </p>
          <div className="relative min-h-[60dvh] flex-1 overflow-auto desk:min-h-0">
            <SourceEditor
              ref={editor}
              source={source}
              problems={reading.problems}
              completions={draft.completions}
              onChange={change}
              onCursor={(line, column) => setCursor({ line, column })}
            />
          </div>
        </section>
        <section
          aria-label="Preview"
          className={`min-h-0 min-w-0 flex-col border-rule-strong bg-ground desk:flex desk:border-l-strong ${shown === "preview" ? "flex" : "hidden"}`}
        >
          <p className="border-b-hair border-rule px-6 py-2 text-dense">
            <strong>Preview</strong> <span className="ml-3 text-ink-2">as the technician sees it</span>
          </p>
          <div
            tabIndex={0}
            role="region"
            aria-label="Preview of the module"
            className="relative min-h-0 flex-1 overflow-auto px-6"
          >
            {reading.tree ? (
              <article className="min-h-full bg-sheet px-6 py-5">
                <ModuleTree tree={reading.tree} checkCards={reading.checkCards} />
              </article>
            ) : (
              <Notice tone="minus" fact="Nothing can be shown." className="my-5">
                The text cannot be read as far as the first problem. Mend it and the preview comes back.
              </Notice>
            )}
          </div>
        </section>
      </div>
      <ProblemStrip
        lines={source.split("\n").length}
        line={cursor.line}
        problems={reading.problems}
        checking={checking}
        onGo={goTo}
        onRepair={repair}
      />
      <ReleaseDialog
        open={releasing}
        onClose={() => setReleasing(false)}
        employer={employer}
        moduleId={draft.id}
        last={last?.number ?? null}
        save={save}
        action={release}
      />
    </div>
  );
}

function applyRepair(view: EditorView, { text, from, to }: NonNullable<Problem["repair"]>) {
  const start = offsetOf(view, from.line, from.column);
  view.dispatch({
    changes: { from: start, to: offsetOf(view, to.line, to.column), insert: text },
    selection: { anchor: start },
  });
  view.focus();
}

/** Alt+N goes to the next problem after the cursor, and from the last to the first. */
function useNextProblemKey(
  problems: readonly Problem[],
  cursor: { line: number; column: number },
  goTo: (line: number, column: number) => void,
) {
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (!event.altKey || event.code !== "KeyN" || problems.length === 0) return;
      event.preventDefault();
      const after = problems.find(
        ({ line, column }) => line > cursor.line || (line === cursor.line && column > cursor.column),
      );
      const next = after ?? problems[0]!;
      goTo(next.line, next.column);
    };
    addEventListener("keydown", listen);
    return () => removeEventListener("keydown", listen);
  }, [problems, cursor, goTo]);
}
