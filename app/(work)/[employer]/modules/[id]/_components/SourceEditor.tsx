"use client";
import type { CompletionContext, CompletionResult } from "@codemirror/autocomplete";
import { linter, type Diagnostic } from "@codemirror/lint";
import { EditorView } from "@codemirror/view";
import CodeMirror, { type ReactCodeMirrorRef } from "@uiw/react-codemirror";
import { forwardRef, useMemo } from "react";
import type { Completions } from "@/lib/mdx/completions";
import type { Problem } from "@/lib/mdx/problem";
import { moduleLanguage } from "./moduleLanguage";
import { offersAt } from "./offersAt";
import { sourceLook } from "./sourceLook";

type SourceEditorProps = {
  source: string;
  problems: readonly Problem[];
  completions: Completions;
  onChange: (source: string) => void;
  onCursor: (line: number, column: number) => void;
};

/** The module's source, with its problems waved under where they are. */
export const SourceEditor = forwardRef<ReactCodeMirrorRef, SourceEditorProps>(function SourceEditor(
  { source, problems, completions, onChange, onCursor },
  ref,
) {
  const extensions = useMemo(
    () => [
      moduleLanguage,
      moduleLanguage.language.data.of({ autocomplete: (at: CompletionContext) => offered(completions, at) }),
      sourceLook,
      EditorView.lineWrapping,
      EditorView.cspNonce.of(documentNonce()),
      // What is edited is a tab stop without the attribute, but tools that look for one do not know it.
      EditorView.contentAttributes.of({ "aria-label": "Source of the module", spellcheck: "false", tabindex: "0" }),
      linter((view) => problems.map((problem) => diagnostic(view, problem)), { delay: 0 }),
    ],
    [problems, completions],
  );
  return (
    <CodeMirror
      ref={ref}
      value={source}
      height="100%"
      theme="none"
      basicSetup={{ foldGutter: false, highlightActiveLine: true, autocompletion: true, searchKeymap: true }}
      // The Tab key leads on to the preview: a key that indents would keep people without a mouse in here.
      indentWithTab={false}
      extensions={extensions}
      onChange={onChange}
      onUpdate={(update) => {
        if (!update.selectionSet && !update.docChanged) return;
        const at = update.state.selection.main.head;
        const line = update.state.doc.lineAt(at);
        onCursor(line.number, at - line.from + 1);
      }}
      className="h-full text-[0.875rem]"
    />
  );
});

/**
 * The nonce that the document was loaded with: the only one its policy knows. Later answers of the server bring nonces of
 * their own, and the meta element follows them; a script that was there from the start keeps the first.
 */
function documentNonce(): string {
  if (typeof document === "undefined") return "";
  return [...document.scripts].find((script) => script.nonce)?.nonce ?? "";
}

function offered(completions: Completions, at: CompletionContext): CompletionResult | null {
  const offers = offersAt(completions, at.state.sliceDoc(0, at.pos));
  if (!offers || (!at.explicit && offers.from === at.pos)) return null;
  return {
    from: offers.from,
    options: offers.rows.map(({ label, detail, insert }) => ({ label, detail, apply: insert })),
    filter: true,
  };
}

function diagnostic(view: EditorView, problem: Problem): Diagnostic {
  const from = offsetOf(view, problem.line, problem.column);
  const to = problem.endLine ? offsetOf(view, problem.endLine, problem.endColumn ?? 1) : from + 1;
  return {
    from,
    to: Math.max(from, Math.min(to, view.state.doc.length)),
    severity: problem.severity,
    message: problem.message,
  };
}

/** Where a line and column are in the text as it stands now; it may have grown shorter since it was checked. */
export function offsetOf(view: EditorView, line: number, column: number): number {
  const doc = view.state.doc;
  const at = doc.line(Math.min(Math.max(1, line), doc.lines));
  return Math.min(at.from + Math.max(0, column - 1), at.to);
}
