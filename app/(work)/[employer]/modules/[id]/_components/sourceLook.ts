"use client";
import { HighlightStyle, syntaxHighlighting } from "@codemirror/language";
import { EditorView } from "@codemirror/view";
import { tags } from "@lezer/highlight";

const style = HighlightStyle.define([
  { tag: tags.meta, color: "var(--ink-2)" },
  { tag: tags.heading, fontWeight: "700" },
  { tag: tags.strong, fontWeight: "700" },
  { tag: tags.emphasis, fontStyle: "italic" },
  { tag: tags.comment, color: "var(--ink-3)", fontStyle: "italic" },
  { tag: [tags.angleBracket, tags.tagName], color: "var(--plus)", fontWeight: "700" },
  { tag: [tags.link, tags.url], color: "var(--plus)" },
  { tag: [tags.processingInstruction, tags.contentSeparator], color: "var(--ink-3)" },
]);

/** The design's colours: names of components blue and bold, the rest by weight and slope. */
export const sourceLook = [
  syntaxHighlighting(style),
  EditorView.theme({
    "&": { backgroundColor: "var(--sheet)", color: "var(--ink)", height: "100%" },
    ".cm-content": {
      fontFamily: "var(--f-code)",
      lineHeight: "1.375rem",
      caretColor: "var(--ink)",
      paddingBlock: "12px",
    },
    ".cm-gutters": { backgroundColor: "var(--sheet)", color: "var(--ink-3)", border: "0", fontFamily: "var(--f-code)" },
    ".cm-activeLine, .cm-activeLineGutter": { backgroundColor: "var(--well)" },
    "&.cm-focused .cm-selectionBackground, .cm-selectionBackground": { backgroundColor: "var(--plus-wash) !important" },
    ".cm-cursor": { borderLeftColor: "var(--ink)", borderLeftWidth: "2px" },
    ".cm-lintRange-error": {
      backgroundImage: "none",
      textDecoration: "underline wavy var(--minus)",
      backgroundColor: "var(--minus-wash)",
    },
    ".cm-lintRange-warning": { backgroundImage: "none", textDecoration: "underline wavy var(--caution-deep)" },
    ".cm-tooltip-autocomplete ul": { fontFamily: "var(--f-code)", maxHeight: "16rem" },
    ".cm-tooltip-autocomplete ul li": { padding: "6px 12px !important" },
    ".cm-tooltip-autocomplete ul li[aria-selected]": {
      backgroundColor: "var(--plus-wash) !important",
      color: "var(--ink) !important",
    },
    ".cm-completionDetail": { fontFamily: "var(--f-text)", fontStyle: "normal", color: "var(--ink-2)" },
    ".cm-tooltip": { backgroundColor: "var(--sheet)", border: "2px solid var(--rule-strong)", color: "var(--ink)" },
  }),
];
